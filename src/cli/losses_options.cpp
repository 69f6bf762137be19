#include "cli/losses_options.hpp"

#include <string_view>

#include "cli/same_file.hpp"
#include "rainledger/base/quantity.hpp"

namespace rainledger {
namespace {

std::string scenario_problem(const std::vector<std::string>& words, bool has_every) {
    if (words.empty()) return "no scenario given; write 'rainledger losses SCENARIO'";
    if (words.front().empty()) return "the name of the scenario is empty";
    if (words.size() == 1) return {};
    std::string out = "one scenario at a time; '" + words[1] + "' is one word too many";
    if (has_every && find_unit(words[1], Dimension::time))
        out += " (write a duration as one word: --every '15 min')";
    return out;
}

std::string read_every(const std::string& text, LossesOptions& options) {
    const ParsedQuantity parsed = parse_quantity(text, Dimension::time);
    if (!parsed.value) return "--every: " + parsed.problem + "; " + parsed.hint;
    if (!(*parsed.value > 0.0)) return "--every: '" + text + "' is no step; it must be above zero";
    options.every_h = parsed.value;
    return {};
}

std::string read_units(std::string_view text, LossesOptions& options) {
    if (text != "mm" && text != "in")
        return "--units: '" + std::string(text) + "' is not known; write mm or in";
    options.units = text == "in" ? DisplayUnits::inches : DisplayUnits::metric;
    return {};
}

std::string file_problem(const LossesOptions& options) {
    if (options.ledger == "-")
        return "--ledger: the ledger goes to a file, not to '-'; "
               "for standard output write --ledger /dev/stdout";
    const std::vector<std::string> paths = options.output_paths();
    if (paths.size() == 2 && is_same_file(paths[0], paths[1]))
        return "--ledger and --json name the same file '" + paths[1] + "'";
    for (const std::string& path : paths)
        if (is_same_file(path, options.scenario))
            return "'" + path + "' is the scenario itself; name another file to write";
    return {};
}

std::string read_values(const Arguments& arguments, LossesOptions& options) {
    if (const std::string* text = arguments.find("units"))
        if (std::string problem = read_units(*text, options); !problem.empty()) return problem;
    if (const std::string* text = arguments.find("every")) return read_every(*text, options);
    return {};
}

}  // namespace

std::vector<std::string> LossesOptions::output_paths() const {
    std::vector<std::string> paths;
    if (ledger) paths.push_back(*ledger);
    if (json && !json_on_stdout()) paths.push_back(*json);
    return paths;
}

std::optional<LossesOptions> read_losses_options(std::span<const std::string> given,
                                                 std::string& problem) {
    const Arguments arguments = sort_arguments(given, kLossesOptions);
    problem = arguments.problem;
    if (problem.empty()) problem = scenario_problem(arguments.words, arguments.has("every"));
    if (!problem.empty()) return std::nullopt;

    LossesOptions options;
    options.scenario = arguments.words.front();
    options.quiet = arguments.has("quiet");
    if (const std::string* path = arguments.find("ledger")) options.ledger = *path;
    if (const std::string* path = arguments.find("json")) options.json = *path;
    problem = read_values(arguments, options);
    if (problem.empty()) problem = file_problem(options);
    if (!problem.empty()) return std::nullopt;
    return options;
}

}  // namespace rainledger
