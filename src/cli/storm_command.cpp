#include "cli/storm_command.hpp"

#include <array>
#include <span>
#include <string_view>
#include <utility>
#include <variant>

#include "cli/storm_sources.hpp"
#include "rainledger/base/printable.hpp"
#include "rainledger/report/hyetograph_csv.hpp"
#include "rainledger/report/storm_json.hpp"
#include "rainledger/report/storm_summary.hpp"

namespace rainledger {
namespace {

/// The way out where an option asks for `wanted` and the input is another kind.
std::string_view misplaced_hint(const StormOptions& options, InputKind wanted, InputKind kind) {
    if (wanted == InputKind::rain && kind == InputKind::scenario) return "; name the record itself";
    // What was taken as rain may be a table in a form that was not known as one.
    if (wanted == InputKind::statistics && kind == InputKind::rain && !options.tip_mm)
        return "; a table has a row such as 'duration,2 yr [mm],10 yr [mm]' above its rows, "
               "'5 min,8.2,12.5'";
    return {};
}

/// Options that go with another kind of input than the one at hand.
std::string misplaced(const StormOptions& options, InputKind kind, std::string_view noun) {
    struct Group {
        InputKind kind;
        std::string_view goes_with;
        std::span<const OptionRow> rows;
        bool with_scenarios = false;
    };
    const std::array groups{Group{InputKind::scenario, "a scenario", kStormScenario},
                            Group{InputKind::statistics, "a table of statistics", kStormDesign},
                            Group{InputKind::rain, "a gauge record", kStormRecord},
                            Group{InputKind::rain, "a gauge record", kStormEvents, true}};
    for (const Group& group : groups) {
        if (group.kind == kind || (group.with_scenarios && kind == InputKind::scenario)) continue;
        if (const auto option = options.first_of(group.rows))
            return "--" + *option + " goes with " + std::string(group.goes_with) + ", and '" +
                   options.input + "' is " + std::string(noun) +
                   std::string(misplaced_hint(options, group.kind, kind));
    }
    return {};
}

Gathered gather(const StormOptions& options, StormInput input, Diagnostics& diagnostics) {
    const auto with = [&](std::string_view noun, auto storms_of) -> Gathered {
        if (std::string problem = misplaced(options, input.kind, noun); !problem.empty())
            return {std::nullopt, std::move(problem)};
        return storms_of(options, std::move(input), diagnostics);
    };
    switch (input.kind) {
        case InputKind::scenario:
            return with("a scenario", storms_of_scenario);
        case InputKind::statistics:
            return with("a table of statistics", storms_of_statistics);
        case InputKind::rain:
            break;
    }
    return with("rain", storms_of_rain);
}

/// Files that what was found cannot fill.
std::string content_problem(const StormOptions& options, const StormFindings& findings) {
    const auto* scenario = std::get_if<Scenario>(&findings.found);
    if (scenario != nullptr) {
        if (!options.csv || scenario->storms.size() == 1) return {};
        return "--csv writes one storm; choose it with --storm NAME: " +
               first_names(names_of(scenario->storms));
    }
    const char* const option = options.csv ? "--csv" : options.chart ? "--chart" : nullptr;
    if (option == nullptr) return {};
    if (std::holds_alternative<ShownTable>(findings.found))
        return std::string(option) +
               " needs a storm; make one of the table with --duration and --every";
    if (options.events || options.sort)
        return std::string(option) + " needs a storm, and " +
               (options.events ? "--events" : "--sort") + " lists events; leave out one of the two";
    return std::string(option) + " needs a storm; cut one out of the record with --event NUMBER";
}

/// The findings as people read them, and as programs do.
struct SummaryOf {
    const StormOptions& options;

    std::string operator()(const Scenario& scenario) const {
        return storm_summary(scenario, {options.units});
    }
    std::string operator()(const ShownTable& table) const {
        return statistics_summary(table.title, table.statistics, table.fits, {options.units});
    }
    std::string operator()(const ShownEvents& shown) const {
        return events_summary(shown.title, shown.record, shown.rule, shown.events, shown.rarities,
                              options.sort.value_or(EventOrder::time), {options.units});
    }
};
struct JsonOf {
    std::span<const std::string> warnings;

    std::string operator()(const Scenario& scenario) const {
        return storm_json(scenario, warnings);
    }
    std::string operator()(const ShownTable& table) const {
        return statistics_json(table.title, table.statistics, table.fits, warnings);
    }
    std::string operator()(const ShownEvents& shown) const {
        return events_json(shown.title, shown.record, shown.rule, shown.events, shown.rarities,
                           warnings);
    }
};

/// Writes every file in the order of options.outputs(), then standard output, then gives the files
/// their names.
bool write_all(const StormOptions& options, const StormFindings& findings, const std::string& chart,
               std::span<const std::string> warnings, OutputFiles& files, std::string& problem) {
    if (options.csv) {
        const Storm& storm = std::get<Scenario>(findings.found).storms.front();
        if (!files.write_next(hyetograph_csv(storm.rain), problem)) return false;
    }
    std::string json;
    if (options.json) json = std::visit(JsonOf{warnings}, findings.found);
    if (options.json && options.json != "-" && !files.write_next(json, problem)) return false;
    if (options.chart && options.chart != "-" && !files.write_next(chart, problem)) return false;
    if (options.json == "-") return finish(files, json, problem);
    std::string shown = printable(options.input) + " is read as " + findings.read_as + ".\n\n" +
                        std::visit(SummaryOf{options}, findings.found);
    if (options.chart == "-") shown += "\n" + chart;
    return finish(files, shown, problem);
}

/// Draws and writes, once everything is known to be right.
ExitStatus deliver(const StormOptions& options, const Messages& messages,
                   const StormFindings& findings, const Diagnostics& diagnostics) {
    std::string problem;
    OutputFiles files;
    if (!open_all(files, options.outputs(), problem)) return cannot_write(messages, problem);
    messages.show(diagnostics);
    Chart chart{std::string(), {}, {}};
    if (options.chart)
        chart = hyetograph_chart(std::get<Scenario>(findings.found),
                                 {*chart_format(*options.chart), options.units});
    if (!chart.bytes) return cannot_draw("storm", messages, chart);
    if (!write_all(options, findings, *chart.bytes, listed(diagnostics), files, problem))
        return cannot_write(messages, problem);
    return ExitStatus::done;
}

}  // namespace

ExitStatus run_storm(const StormOptions& options) {
    const Messages messages(options.quiet);
    Diagnostics diagnostics;
    auto input = read_storm_input(options, diagnostics);
    if (!input) return refuse(messages, diagnostics);
    Gathered gathered = gather(options, *std::move(input), diagnostics);
    if (gathered.findings) gathered.problem = content_problem(options, *gathered.findings);
    if (!gathered.problem.empty()) return wrong_usage("storm", gathered.problem);
    if (!gathered.findings) return refuse(messages, diagnostics);
    return deliver(options, messages, *gathered.findings, diagnostics);
}

}  // namespace rainledger
