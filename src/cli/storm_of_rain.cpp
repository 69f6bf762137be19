#include <algorithm>
#include <cstddef>
#include <string_view>
#include <utility>
#include <variant>

#include "cli/storm_sources.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "rainledger/scenario/storm_making.hpp"

// Rain as measured: one storm of elapsed times, a gauge record's events, or one of them.
namespace rainledger {
namespace {

constexpr double kMsPerHour = 3600.0e3;

RecordSource source_of(const StormOptions& options) {
    RecordSource source;
    source.path = options.input;
    source.layout.csv.zone = options.zone;
    source.layout.tip_mm = options.tip_mm;
    source.rule.dry_spell_h = options.dry_spell_h.value_or(source.rule.dry_spell_h);
    source.rule.threshold_mm = options.threshold_mm.value_or(source.rule.threshold_mm);
    source.steps.every_h = options.every_h.value_or(source.steps.every_h);
    source.steps.spread_tips = options.spread_tips;
    source.statistics_path = options.statistics;
    return source;
}

/// Options that contradict each other for a record.
std::string record_problem(const StormOptions& options) {
    if (options.events && options.event)
        return "--events lists them all and --event takes one; leave out one of the two";
    if (options.sort && options.event) return "--sort goes with the list of --events";
    if (options.sort == EventOrder::rarity && !options.statistics)
        return "--sort rarity needs --statistics FILE.csv, which says how rare an event was";
    if (options.spread_tips && !options.tip_mm)
        return "--spread-tips goes with a tip log; say what a tip is worth, such as --tip '0.2 mm'";
    if (options.every_h && !options.tip_mm && !options.event)
        return "--every gives one storm other steps; choose one with --event NUMBER";
    return {};
}

/// A record whose steps would be far too many; tips alone become steps.
std::string step_problem(const StormOptions& options, const GaugeRecord& record) {
    constexpr double kMostSteps = 1.0e8;
    constexpr double kLongestStepH = 24.0;
    if (record.is_tips() && options.every_h > kLongestStepH)
        return "--every: tips become steps that count from midnight, of a day at most";
    const RecordSpan span = span_of(record);
    const double hours = static_cast<double>(span.to_ms - span.from_ms) / kMsPerHour;
    if (!record.is_tips() || !options.every_h || hours <= kMostSteps * *options.every_h) return {};
    return "--every: that step would cut the record into more than 100 million";
}

const RainEvent* find_event(std::size_t number, const RecordEvents& events) {
    const auto& list = events.events;
    if (number == 0 && !list.empty())
        return &*std::ranges::max_element(list, {}, &RainEvent::depth_mm);
    return number > 0 && number <= list.size() ? &list[number - 1] : nullptr;
}

std::string event_problem(const StormOptions& options, const RecordEvents& events) {
    const std::size_t count = events.events.size();
    if (count == 0) return "--event: '" + options.input + "' holds no event";
    return "--event: there is no event " + std::to_string(*options.event) + "; '" + options.input +
           "' holds " + std::to_string(count) + ", which --events lists";
}

Gathered cut_event(const StormOptions& options, const OpenedRecord& read, std::string read_as) {
    const RecordSource& source = read.source;
    const RecordEvents events = find_events(read.record, source.rule, source.steps);
    const RainEvent* event = find_event(*options.event, events);
    if (event == nullptr) return {std::nullopt, event_problem(options, events)};
    Scenario scenario;
    scenario.title = "Storm of " + options.input;
    scenario.storms.push_back(storm_of_event(read.record, events, *event, source,
                                             read.statistics ? &*read.statistics : nullptr));
    if (!read.record.is_tips())
        if (std::string problem = take_steps(options, scenario.storms.front()); !problem.empty())
            return {std::nullopt, std::move(problem)};
    return {StormFindings{std::move(read_as), std::move(scenario)}, {}};
}

Gathered storms_of_record(const StormOptions& options, GaugeRecord record,
                          Diagnostics& diagnostics) {
    std::string read_as = "a gauge record: its rows carry dates";
    if (options.tip_mm)
        read_as = "a tip log: --tip says what a tip is worth";
    else if (!std::get<Hyetograph>(record.rain).stamps)
        read_as = "a gauge record of elapsed times";
    std::string problem = record_problem(options);
    if (problem.empty()) problem = step_problem(options, record);
    OpenedRecord read{std::move(record), source_of(options), std::nullopt};
    if (!problem.empty() || !read_statistics(read, "--statistics", diagnostics, problem))
        return {std::nullopt, std::move(problem)};
    return options.event
               ? cut_event(options, read, std::move(read_as))
               : list_events("Events of " + options.input, std::move(read), std::move(read_as));
}

bool has_elapsed_times(const GaugeRecord& record) {
    const auto* rain = std::get_if<Hyetograph>(&record.rain);
    return rain != nullptr && !rain->stamps;
}

Gathered one_storm(const StormOptions& options, std::string text, Diagnostics& diagnostics) {
    auto rain = read_hyetograph_csv(options.input, std::move(text), {}, diagnostics);
    if (!rain) return {};
    Scenario scenario;
    scenario.title = "Storm of " + options.input;
    Storm& storm = scenario.storms.emplace_back();
    storm.name = "storm";
    storm.rain = *std::move(rain);
    storm.file = options.input;
    if (std::string problem = take_steps(options, storm); !problem.empty())
        return {std::nullopt, std::move(problem)};
    return {StormFindings{"one storm: its times are elapsed, without dates", std::move(scenario)},
            {}};
}

}  // namespace

Gathered storms_of_rain(const StormOptions& options, StormInput input, Diagnostics& diagnostics) {
    if (!options.tip_mm && looks_like_tips(input.text))
        return {std::nullopt, "'" + options.input +
                                  "' has times and no depths, as a tip log; say what a tip is "
                                  "worth, such as --tip '0.2 mm'"};
    // Rain of elapsed times and nothing asked about events: it is one storm.
    const bool may_be_one_storm =
        !options.first_of(kStormRecord) && !options.first_of(kStormEvents);
    std::string again = may_be_one_storm ? input.text : std::string();
    Diagnostics of_record;
    auto record = read_gauge_record(options.input, std::move(input.text), source_of(options).layout,
                                    of_record);
    if (record && may_be_one_storm && has_elapsed_times(*record))
        return one_storm(options, std::move(again), diagnostics);
    diagnostics = std::move(of_record);
    if (!record) return {};
    return storms_of_record(options, *std::move(record), diagnostics);
}

}  // namespace rainledger
