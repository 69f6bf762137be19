#include "cli/fit_options.hpp"

#include <algorithm>
#include <utility>

#include "cli/option_values.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

/// The laws that a scenario takes, the first of all laws.
constexpr std::span kLawsOfScenarios = std::span(kFieldLaws).first(3);

std::string read_law(const Arguments& arguments, FitOptions& options) {
    const std::string* text = arguments.find("law");
    if (text == nullptr) return {};
    if (!options.yaml) return "--law goes with --yaml FILE.yaml, whose law it names";
    std::vector<std::string_view> names;
    for (const FieldLaw law : kFieldLaws) {
        const bool known = std::ranges::find(kLawsOfScenarios, law) != kLawsOfScenarios.end();
        if (known) names.push_back(field_law_key(law));
        if (*text != field_law_key(law)) continue;
        if (!known)
            return "--law: scenarios do not know " + *text +
                   ", which is fitted for comparison; write horton, green_ampt or philip";
        options.law = law;
        return {};
    }
    return unknown_word("law", *text, names);
}

/// One diameter out of --ring.
std::string read_diameter(std::string_view text, double& diameter_mm) {
    constexpr double kSmallest_mm = 1.0;
    constexpr double kLargest_mm = 1.0e5;
    const ParsedQuantity parsed = parse_quantity(text, Dimension::depth);
    if (!parsed.value)
        return "--ring: " + parsed.problem +
               "; write '300 mm', or '300 mm, 600 mm' for an inner and an outer ring";
    if (!(*parsed.value >= kSmallest_mm && *parsed.value <= kLargest_mm))
        return "--ring: '" + std::string(text) + "' is no diameter of a ring; check the unit";
    diameter_mm = *parsed.value;
    return {};
}

std::string read_ring(const Arguments& arguments, FitOptions& options) {
    const std::string* text = arguments.find("ring");
    if (text == nullptr) return {};
    const std::string_view all = *text;
    const std::size_t comma = all.find(',');
    Rings rings;
    std::string problem = read_diameter(all.substr(0, comma), rings.inner_diameter_mm);
    if (problem.empty() && comma != std::string_view::npos)
        problem = read_diameter(all.substr(comma + 1), rings.outer_diameter_mm.emplace());
    if (!problem.empty()) return problem;
    if (std::string unsound = rings_problem(rings); !unsound.empty()) return "--ring: " + unsound;
    options.rings = rings;
    return {};
}

std::string read_design_factor(const Arguments& arguments, FitOptions& options) {
    constexpr double kLargest = 1.0e6;
    const std::string* text = arguments.find("design-factor");
    if (text == nullptr) return {};
    const auto factor = parse_number(*text);
    if (!factor || !(*factor >= 1.0 && *factor <= kLargest))
        return "--design-factor: '" + *text +
               "' is no factor; it divides every rate: write 1 or more, such as 2";
    options.design_factor = factor;
    return {};
}

std::string to_a_file(const std::optional<std::string>& path, const std::string& option,
                      const std::string& what) {
    if (path != "-") return {};
    return "--" + option + ": " + what + " go to a file, not to '-'; for standard output write --" +
           option + " /dev/stdout";
}

std::string read_values(const Arguments& arguments, FitOptions& options) {
    std::string problem = read_units(arguments, options.units);
    const auto then = [&](std::string next) {
        if (problem.empty()) problem = std::move(next);
    };
    then(read_law(arguments, options));
    then(read_ring(arguments, options));
    then(read_design_factor(arguments, options));
    then(to_a_file(options.csv, "csv", "the readings"));
    then(to_a_file(options.yaml, "yaml", "the losses"));
    then(chart_problem(options.chart));
    then(standard_output_problem(options.json, options.chart));
    then(outputs_problem(options.outputs(), options.input, "test"));
    return problem;
}

}  // namespace

std::vector<Output> FitOptions::outputs() const {
    std::vector<Output> outputs;
    add_output(outputs, "csv", csv);
    add_output(outputs, "json", json);
    add_output(outputs, "yaml", yaml);
    add_output(outputs, "chart", chart);
    return outputs;
}

std::optional<FitOptions> read_fit_options(std::span<const std::string> given,
                                           std::string& problem) {
    const Arguments arguments = sort_arguments(given, kFitOptions);
    problem = arguments.problem;
    if (problem.empty())
        problem = input_problem(arguments, {"fit", "test",
                                            "write a diameter as one word: --ring "
                                            "'300 mm'",
                                            arguments.has("ring")});
    if (!problem.empty()) return std::nullopt;

    FitOptions options;
    options.input = arguments.words.front();
    options.quiet = arguments.has("quiet");
    read_text(arguments, "csv", options.csv);
    read_text(arguments, "json", options.json);
    read_text(arguments, "yaml", options.yaml);
    read_text(arguments, "chart", options.chart);
    problem = read_values(arguments, options);
    if (!problem.empty()) return std::nullopt;
    return options;
}

}  // namespace rainledger
