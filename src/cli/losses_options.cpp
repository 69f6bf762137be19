#include "cli/losses_options.hpp"

#include "cli/option_values.hpp"

namespace rainledger {
namespace {

std::string file_problem(const LossesOptions& options) {
    if (options.ledger == "-")
        return "--ledger: the ledger goes to a file, not to '-'; "
               "for standard output write --ledger /dev/stdout";
    if (std::string problem = chart_problem(options.chart); !problem.empty()) return problem;
    if (std::string problem = standard_output_problem(options.json, options.chart);
        !problem.empty())
        return problem;
    return outputs_problem(options.outputs(), options.scenario, "scenario");
}

/// Options that say what a chart shows, without a chart.
std::string choice_problem(const LossesOptions& options) {
    if (options.chart) return {};
    if (options.chart_storm) return "--storm says what a chart shows; add --chart FILE";
    if (options.chart_surface) return "--surface says what a chart shows; add --chart FILE";
    return {};
}

std::string read_values(const Arguments& arguments, LossesOptions& options) {
    if (std::string problem = read_units(arguments, options.units); !problem.empty())
        return problem;
    return read_amount(arguments, "every", Dimension::time, "step", options.every_h);
}

}  // namespace

std::vector<Output> LossesOptions::outputs() const {
    std::vector<Output> outputs;
    add_output(outputs, "ledger", ledger);
    add_output(outputs, "json", json);
    add_output(outputs, "chart", chart);
    return outputs;
}

std::optional<LossesOptions> read_losses_options(std::span<const std::string> given,
                                                 std::string& problem) {
    const Arguments arguments = sort_arguments(given, kLossesOptions);
    problem = arguments.problem;
    if (problem.empty())
        problem = input_problem(
            arguments, {"losses", "scenario", "write a duration as one word: --every '15 min'",
                        arguments.has("every")});
    if (!problem.empty()) return std::nullopt;

    LossesOptions options;
    options.scenario = arguments.words.front();
    options.quiet = arguments.has("quiet");
    read_text(arguments, "ledger", options.ledger);
    read_text(arguments, "json", options.json);
    read_text(arguments, "chart", options.chart);
    read_text(arguments, "storm", options.chart_storm);
    read_text(arguments, "surface", options.chart_surface);
    problem = read_values(arguments, options);
    if (problem.empty()) problem = file_problem(options);
    if (problem.empty()) problem = choice_problem(options);
    if (!problem.empty()) return std::nullopt;
    return options;
}

}  // namespace rainledger
