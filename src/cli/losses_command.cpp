#include "cli/losses_command.hpp"

#include <algorithm>
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "cli/run_files.hpp"
#include "rainledger/chart/chart.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/report/json.hpp"
#include "rainledger/report/ledger_csv.hpp"
#include "rainledger/report/summary.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "rainledger/scenario/warnings.hpp"

namespace rainledger {
namespace {

constexpr double kMostReportingSteps = 1.0e7;  // a slip in --every, not a wish

/// What only the scenario shows to be wrong with the command line; empty when nothing is.
std::string late_problem(const LossesOptions& options, const Scenario& scenario) {
    if (std::string problem = rain_files_problem(options.outputs(), scenario.storms);
        !problem.empty())
        return problem;
    for (const Storm& storm : scenario.storms) {
        const auto& edges_h = storm.rain.edges_h;
        if (options.every_h &&
            edges_h.back() - edges_h.front() > kMostReportingSteps * *options.every_h)
            return "--every: that step would cut a storm into more than 10 million";
    }
    return {};
}

/// The place in `items` of the one that has the name asked for; a problem where none has it.
template <class Item>
std::optional<std::size_t> chosen(std::string_view option, const std::optional<std::string>& asked,
                                  const std::vector<Item>& items, std::string& problem) {
    if (!asked) return std::nullopt;
    const auto found = std::ranges::find(items, *asked, &Item::name);
    if (found != items.end()) return static_cast<std::size_t>(found - items.begin());
    problem = name_problem(option, *asked, names_of(items));
    return std::nullopt;
}

ChartChoice chart_choice(const LossesOptions& options, const Scenario& scenario,
                         std::string& problem) {
    ChartChoice choice;
    choice.storm = chosen("storm", options.chart_storm, scenario.storms, problem);
    choice.surface = chosen("surface", options.chart_surface, scenario.site.surfaces, problem);
    return choice;
}

struct Results {
    std::vector<SiteLedger> ledgers;    // one per storm
    std::vector<std::string> warnings;  // as the JSON lists them
    std::string chart;                  // its bytes, where one was asked for
};

Results keep_ledgers(const Scenario& scenario, Diagnostics& diagnostics) {
    Results results;
    for (const Storm& storm : scenario.storms) {
        results.ledgers.push_back(keep_ledger(scenario.site, storm.rain));
        report_unmatched(scenario, storm, results.ledgers.back(), diagnostics);
    }
    return results;
}

/// Prints every warning and collects it for the JSON.
void warn(const LossesOptions& options, const Messages& messages, const Scenario& scenario,
          Diagnostics& diagnostics, Results& results) {
    for (std::size_t i = 0; i < scenario.storms.size(); ++i)
        warn_of_results(scenario, scenario.storms[i], results.ledgers[i], diagnostics);
    messages.show(diagnostics);
    results.warnings = listed(diagnostics);
    if (options.every_h && !options.ledger)
        messages.note("--every shapes the ledger file alone; --ledger FILE.csv writes one");
}

std::string ledger_text(const LossesOptions& options, const Scenario& scenario,
                        const Results& results) {
    const bool with_start = has_start_column(scenario);
    std::string out;
    append_ledger_header(out, with_start);
    for (std::size_t i = 0; i < scenario.storms.size(); ++i) {
        const Storm& storm = scenario.storms[i];
        if (options.every_h)
            append_ledger_rows(
                out, scenario.site, storm,
                report_every(scenario.site, storm.rain, *options.every_h, results.ledgers[i]),
                with_start);
        else
            append_ledger_rows(out, scenario.site, storm, results.ledgers[i], with_start);
    }
    return out;
}

/// Writes every file in the order of options.outputs(), then standard output, then gives the files
/// their names.
bool write_all(const LossesOptions& options, const Scenario& scenario, const Results& results,
               OutputFiles& files, std::string& problem) {
    if (options.ledger && !files.write_next(ledger_text(options, scenario, results), problem))
        return false;
    std::string json;
    if (options.json) json = results_json(scenario, results.ledgers, results.warnings);
    if (options.json && !options.json_on_stdout() && !files.write_next(json, problem)) return false;
    if (options.chart && options.chart != "-" && !files.write_next(results.chart, problem))
        return false;
    std::string shown = options.json_on_stdout()
                            ? std::move(json)
                            : summary(scenario, results.ledgers, {options.units});
    if (options.chart == "-") shown += "\n" + results.chart;
    return finish(files, shown, problem);
}

/// Marches, draws and writes, once the command line and the scenario are known to be right.
ExitStatus compute(const LossesOptions& options, const Messages& messages, const Scenario& scenario,
                   const ChartChoice& choice, Diagnostics& diagnostics) {
    std::string problem;
    OutputFiles files;
    const bool opened = open_all(files, options.outputs(), problem);
    // Marched even where an output cannot be written: an input error that only the march can tell
    // comes first.
    Results results = keep_ledgers(scenario, diagnostics);
    if (diagnostics.has_errors()) return refuse(messages, diagnostics);
    if (!opened) return cannot_write(messages, problem);
    warn(options, messages, scenario, diagnostics, results);
    if (options.chart) {
        Chart chart = losses_chart(scenario, results.ledgers, choice,
                                   {*chart_format(*options.chart), options.units});
        if (!chart.bytes) return cannot_draw("losses", messages, chart);
        results.chart = std::move(*chart.bytes);
    }
    if (!write_all(options, scenario, results, files, problem))
        return cannot_write(messages, problem);
    return ExitStatus::done;
}

}  // namespace

ExitStatus run_losses(const LossesOptions& options) {
    const Messages messages(options.quiet);
    Diagnostics diagnostics;
    const std::optional<Scenario> scenario = read_scenario(options.scenario, diagnostics);
    if (!scenario) return refuse(messages, diagnostics);
    std::string problem = late_problem(options, *scenario);
    const ChartChoice choice = chart_choice(options, *scenario, problem);
    if (!problem.empty()) return wrong_usage("losses", problem);
    return compute(options, messages, *scenario, choice, diagnostics);
}

}  // namespace rainledger
