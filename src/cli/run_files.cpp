#include "cli/run_files.hpp"

#include <algorithm>
#include <cstddef>

#include "cli/same_file.hpp"
#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

bool is_error(const Diagnostic& diagnostic) {
    return diagnostic.severity == Severity::error;
}

/// "3 errors in FILE" where one file holds them all, else "3 errors".
std::string error_count_text(const Diagnostics& diagnostics) {
    const auto& list = diagnostics.list();
    const auto first = std::ranges::find_if(list, is_error);
    const std::size_t count = diagnostics.error_count();
    std::string out = std::to_string(count) + (count == 1 ? " error" : " errors");
    const bool one_file = std::ranges::all_of(list, [&](const Diagnostic& diagnostic) {
        return !is_error(diagnostic) || diagnostic.place.file == first->place.file;
    });
    if (one_file) out += " in " + first->place.file;
    return out;
}

std::string located(const Place& place, const std::string& message) {
    if (place.line == 0) return place.file + ": " + message;
    return place.file + ":" + std::to_string(place.line) + ":" + std::to_string(place.column) +
           ": " + message;
}

}  // namespace

ExitStatus refuse(const Messages& messages, const Diagnostics& diagnostics) {
    messages.show(diagnostics);
    messages.error(error_count_text(diagnostics) + "; nothing was computed");
    const bool any_wrong =
        std::ranges::any_of(diagnostics.list(), [](const Diagnostic& diagnostic) {
            return is_error(diagnostic) && diagnostic.trouble == Trouble::input;
        });
    return any_wrong ? ExitStatus::wrong_input : ExitStatus::file_trouble;
}

ExitStatus wrong_usage(std::string_view command, std::string_view problem) {
    print_wrong_usage(command, problem);
    return ExitStatus::wrong_usage;
}

std::vector<std::string> listed(const Diagnostics& diagnostics) {
    std::vector<std::string> out;
    for (const Diagnostic& diagnostic : diagnostics.list())
        out.push_back(located(diagnostic.place, diagnostic.message));
    return out;
}

void add_output(std::vector<Output>& outputs, std::string_view option,
                const std::optional<std::string>& path) {
    if (path && *path != "-") outputs.push_back({option, *path});
}

std::string outputs_problem(std::span<const Output> outputs, const std::string& input,
                            std::string_view noun) {
    for (std::size_t i = 0; i < outputs.size(); ++i)
        for (std::size_t j = i + 1; j < outputs.size(); ++j)
            if (is_same_file(outputs[i].path, outputs[j].path))
                return "--" + std::string(outputs[i].option) + " and --" +
                       std::string(outputs[j].option) + " name the same file '" + outputs[j].path +
                       "'";
    for (const Output& output : outputs)
        if (is_same_file(output.path, input))
            return "'" + output.path + "' is the " + std::string(noun) +
                   " itself; name another file to write";
    return {};
}

std::string standard_output_problem(const std::optional<std::string>& json,
                                    const std::optional<std::string>& chart) {
    if (json != "-" || chart != "-") return {};
    return "--json and --chart cannot both go to standard output; name a file for one of them";
}

std::string rain_files_problem(std::span<const Output> outputs, std::span<const Storm> storms) {
    for (const Output& output : outputs)
        for (const Storm& storm : storms)
            for (const std::string& input : storm.files)
                if (is_same_file(output.path, input))
                    return "'" + output.path +
                           "' is the scenario's rain; name another file to write";
    return {};
}

std::string first_names(std::span<const std::string> names) {
    constexpr std::size_t kMostListed = 12;
    std::string out;
    for (const std::string& name : names.first(std::min(names.size(), kMostListed)))
        out += (out.empty() ? "" : ", ") + name;
    if (names.size() > kMostListed)
        out += " and " + std::to_string(names.size() - kMostListed) + " more";
    return out;
}

std::string name_problem(std::string_view option, const std::string& typed,
                         std::span<const std::string> names) {
    const std::vector<std::string_view> views(names.begin(), names.end());
    std::string out = "--" + std::string(option) + ": '" + typed + "' is not known; ";
    if (const auto near = nearest(typed, views))
        return out + "did you mean '" + std::string(*near) + "'?";
    return out + "known here: " + first_names(names);
}

bool open_all(OutputFiles& files, std::span<const Output> outputs, std::string& problem) {
    return std::ranges::all_of(
        outputs, [&](const Output& output) { return files.open(output.path, problem); });
}

bool finish(OutputFiles& files, std::string_view shown, std::string& problem) {
    if (!write_results(shown, problem)) {
        problem.insert(0, "standard output: ");
        return false;
    }
    return files.commit(problem);
}

ExitStatus cannot_write(const Messages& messages, const std::string& problem) {
    messages.error("cannot write " + problem);
    return ExitStatus::file_trouble;
}

ExitStatus cannot_draw(std::string_view command, const Messages& messages, const Chart& chart) {
    if (chart.too_many)
        return wrong_usage(command, "--chart: " + chart.problem + "; " + chart.hint);
    std::string text = "cannot draw the chart: " + chart.problem;
    if (!chart.hint.empty()) text += "; " + chart.hint;
    messages.error(text + "; nothing was written");
    return ExitStatus::file_trouble;
}

}  // namespace rainledger
