#include <algorithm>
#include <string>
#include <tuple>
#include <utility>
#include <variant>
#include <vector>

#include "cli/storm_sources.hpp"

// The storms of a scenario.
namespace rainledger {
namespace {

/// Keeps the one storm that --storm names. What is wrong, or nothing.
std::string choose_storm(const StormOptions& options, Scenario& scenario) {
    if (!options.storm) return {};
    const auto found = std::ranges::find(scenario.storms, *options.storm, &Storm::name);
    if (found == scenario.storms.end())
        return name_problem("storm", *options.storm, names_of(scenario.storms));
    Storm chosen = std::move(*found);
    scenario.storms.clear();
    scenario.storms.push_back(std::move(chosen));
    return {};
}

/// Whether two storms come out of one list of events.
bool has_same_events(const RecordSource& one, const RecordSource& other) {
    const auto rule_of = [](const RecordSource& source) {
        return std::tuple(source.path, source.layout.tip_mm, source.layout.running_count,
                          source.rule.dry_spell_h, source.rule.threshold_mm, source.steps.every_h,
                          source.steps.spread_tips, source.statistics_path);
    };
    return rule_of(one) == rule_of(other);
}

/// The one record that the storms are taken out of; null with `problem` where there is none, or
/// more than one list of events.
const RecordSource* record_of(const StormOptions& options, const Scenario& scenario,
                              std::string& problem) {
    std::vector<const RecordSource*> sources;
    std::vector<std::string> names;
    for (const Storm& storm : scenario.storms)
        if (const auto* origin = std::get_if<EventOrigin>(&storm.origin)) {
            sources.push_back(&origin->source);
            names.push_back(storm.name);
        }
    if (sources.empty())
        problem = "--events lists the events of a record, and no storm of '" + options.input +
                  "' is taken out of one ('record:')";
    else if (!std::ranges::all_of(sources, [&](const RecordSource* source) {
                 return has_same_events(*source, *sources.front());
             }))
        problem =
            "--events lists one record, taken apart in one way; choose a storm out of it "
            "with --storm NAME: " +
            first_names(names);
    return problem.empty() ? sources.front() : nullptr;
}

/// The events of the record that the scenario's storms are taken out of.
Gathered events_of(const StormOptions& options, const Scenario& scenario, std::string read_as,
                   Diagnostics& diagnostics) {
    std::string problem;
    const RecordSource* source = record_of(options, scenario, problem);
    if (source == nullptr) return {std::nullopt, std::move(problem)};
    if (options.sort == EventOrder::rarity && !source->statistics_path)
        return {std::nullopt,
                "--sort rarity needs a table of statistics: name one under 'record:'"};
    auto text = read_file(source->path, diagnostics);
    if (!text) return {};
    // Its warnings have been told by the reader of the scenario.
    Diagnostics told;
    auto record = read_gauge_record(source->path, *std::move(text), source->layout, told);
    if (!record) return {};
    OpenedRecord read{*std::move(record), *source, std::nullopt};
    if (!read_statistics(read, "statistics", told, problem))
        return {std::nullopt, std::move(problem)};
    return list_events("Events of " + source->path, std::move(read), std::move(read_as));
}

}  // namespace

Gathered storms_of_scenario(const StormOptions& options, StormInput input,
                            Diagnostics& diagnostics) {
    auto scenario =
        read_scenario_text(options.input, std::move(input.text), diagnostics, Surfaces::not_needed);
    if (!scenario) return {};
    std::string problem = rain_files_problem(options.outputs(), scenario->storms);
    if (problem.empty()) problem = choose_storm(options, *scenario);
    const bool events = options.events || options.sort;
    if (problem.empty() && events && options.every_h)
        problem = "--every gives storms other steps, and --events lists events";
    if (!problem.empty()) return {std::nullopt, std::move(problem)};
    std::string read_as = "a scenario, " + input.why;
    if (events) return events_of(options, *scenario, std::move(read_as), diagnostics);
    for (Storm& storm : scenario->storms)
        if (problem.empty()) problem = take_steps(options, storm);
    if (!problem.empty()) return {std::nullopt, std::move(problem)};
    return {StormFindings{std::move(read_as), *std::move(scenario)}, {}};
}

}  // namespace rainledger
