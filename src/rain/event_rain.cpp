#include <algorithm>
#include <cstddef>
#include <cstdint>
#include <optional>
#include <utility>
#include <variant>
#include <vector>

#include "rain/event_figures.hpp"
#include "rain/rain_before.hpp"
#include "rain/rain_elements.hpp"
#include "rain/tip_steps.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/rain/rain_events.hpp"

namespace rainledger {
namespace {

/// Stamped edges of steps, with the UTC offset of the last tip of the range at or before each.
StampedEdges stamped_edges(const TipLog& log, const TipRange& range, const SteppedTips& stepped) {
    StampedEdges edges;
    edges.has_offset = log.has_offset;
    const auto count = static_cast<std::size_t>(stepped.end - stepped.first) + 1;
    edges.unix_ms.reserve(count);
    edges.offset_minutes.reserve(count);
    std::size_t tip = range.first;
    for (std::int64_t k = stepped.first; k <= stepped.end; ++k) {
        const std::int64_t ms = stepped.grid.edge_ms(k);
        while (tip + 1 < range.end && log.unix_ms[tip + 1] <= ms)
            ++tip;
        edges.unix_ms.push_back(ms);
        edges.offset_minutes.push_back(log.has_offset ? log.offset_minutes[tip] : std::int16_t{0});
    }
    return edges;
}

Hyetograph hyetograph_of(const TipLog& log, const TipRange& range, const SteppedTips& stepped) {
    std::vector<double> depth_mm;
    depth_mm.reserve(static_cast<std::size_t>(stepped.end - stepped.first));
    for (const StepRun& run : stepped.runs)
        depth_mm.insert(depth_mm.end(), static_cast<std::size_t>(run.count), run.depth_mm);
    Hyetograph rain = make_hyetograph(stamped_edges(log, range, stepped), std::move(depth_mm));
    rain.clock_assumed = log.clock_assumed;
    return rain;
}

template <typename T>
std::vector<T> part(const std::vector<T>& all, std::size_t first, std::size_t end) {
    return {all.begin() + static_cast<std::ptrdiff_t>(first),
            all.begin() + static_cast<std::ptrdiff_t>(end)};
}

void take_dry_steps(const Hyetograph& from, const ElementRun& steps, Hyetograph& rain) {
    const auto begin = std::ranges::lower_bound(from.dry_steps, steps.first);
    for (auto at = begin; at != from.dry_steps.end() && *at < steps.end; ++at) {
        rain.dry_steps.push_back(*at - steps.first);
        rain.taken_as_dry_h += rain.duration_h[rain.dry_steps.back()];
    }
}

/// Steps of interval data, and where the first one begins and the last one ends if not at their
/// edges.
struct StepCut {
    ElementRun steps;
    std::optional<std::int64_t> from_ms;
    std::optional<std::int64_t> to_ms;
};

StampedEdges edges_of(const StampedEdges& all, const StepCut& cut) {
    StampedEdges edges;
    edges.has_offset = all.has_offset;
    edges.unix_ms = part(all.unix_ms, cut.steps.first, cut.steps.end + 1);
    edges.offset_minutes = part(all.offset_minutes, cut.steps.first, cut.steps.end + 1);
    if (cut.from_ms) edges.unix_ms.front() = *cut.from_ms;
    if (cut.to_ms) {
        edges.unix_ms.back() = *cut.to_ms;
        edges.offset_minutes.back() = all.offset_minutes[cut.steps.end - 1];
    }
    return edges;
}

std::vector<double> edges_of(const GivenEdges& all, const StepCut& cut) {
    const Unit unit = find_unit(all.unit, Dimension::time).value_or(Unit{});
    std::vector<double> edges = part(all.value, cut.steps.first, cut.steps.end + 1);
    if (cut.from_ms)
        edges.front() = unit.from_canonical(static_cast<double>(*cut.from_ms) / kMsPerHour);
    if (cut.to_ms) edges.back() = unit.from_canonical(static_cast<double>(*cut.to_ms) / kMsPerHour);
    return edges;
}

Hyetograph cut_out(const Hyetograph& from, const StepCut& cut) {
    std::vector<double> depth_mm = part(from.depth_mm, cut.steps.first, cut.steps.end);
    Hyetograph rain =
        from.stamps
            ? make_hyetograph(edges_of(*from.stamps, cut), std::move(depth_mm))
            : make_hyetograph(edges_of(*from.given, cut), from.given->unit, std::move(depth_mm));
    rain.clock_assumed = from.clock_assumed;
    take_dry_steps(from, cut.steps, rain);
    return rain;
}

Hyetograph rain_of(const TipLog& log, const RainEvent& event, const EventRule& rule,
                   const EventSteps& steps) {
    const TipRange range{event.first, event.end, {}};
    const StepGrid grid = grid_at(log, event.first, steps);
    return hyetograph_of(log, range, step_tips(log, range, grid, rule, steps.spread_tips));
}

Hyetograph rain_of(const Hyetograph& rain, const RainEvent& event, const EventRule& /*rule*/,
                   const EventSteps& /*steps*/) {
    return cut_out(rain, {{event.first, event.end}, {}, {}});
}

std::size_t tip_at_or_behind(const TipLog& log, std::int64_t ms) {
    const auto at = std::ranges::lower_bound(log.unix_ms, ms);
    return static_cast<std::size_t>(at - log.unix_ms.begin());
}

/// Edges of a log's steps around a stretch of time within it, and the tips between.
struct Window {
    StepGrid grid;
    std::int64_t first = 0;
    std::int64_t end = 0;
    TipRange range;
};

std::optional<Window> window_of(const TipLog& log, std::int64_t from_ms, std::int64_t to_ms,
                                const EventSteps& steps) {
    from_ms = std::max(from_ms, log.unix_ms.front());
    to_ms = std::min(to_ms, log.unix_ms.back());
    if (from_ms > to_ms) return std::nullopt;
    Window window;
    window.grid = grid_at(log, tip_at_or_behind(log, from_ms), steps);
    // A tip just on an edge is in the step that ends there.
    window.first = from_ms == log.unix_ms.front() ? window.grid.step_to(from_ms)
                                                  : window.grid.step_from(from_ms);
    window.end = window.grid.step_to(to_ms) + 1;
    window.end = std::max(window.end, window.first + 1);
    const std::int64_t first_edge_ms = window.grid.edge_ms(window.first);
    window.range.first = tip_at_or_behind(log, first_edge_ms + 1);
    window.range.end = tip_at_or_behind(log, window.grid.edge_ms(window.end) + 1);
    window.range.from_ms = first_edge_ms;
    return window;
}

std::optional<CutRain> cut_between(const TipLog& log, std::int64_t from_ms, std::int64_t to_ms,
                                   const EventSteps& steps, const EventRule& rule) {
    const auto window = window_of(log, from_ms, to_ms, steps);
    if (!window) return std::nullopt;
    SteppedTips stepped;
    stepped.grid = window->grid;
    if (window->range.first < window->range.end)
        stepped = step_tips(log, window->range, window->grid, rule, steps.spread_tips);
    widen(stepped, window->first, window->end);
    // Between tips the offset is that of the tip before.
    TipRange offsets = window->range;
    if (offsets.first > 0) --offsets.first;
    return CutRain{event_of_tips(log, window->range, stepped),
                   hyetograph_of(log, offsets, stepped)};
}

/// The steps of interval data that a stretch of time touches.
std::optional<ElementRun> steps_within(const Hyetograph& rain, std::int64_t from_ms,
                                       std::int64_t to_ms) {
    const std::size_t first = std::max<std::size_t>(edge_behind(rain, from_ms), 1) - 1;
    const std::size_t end = std::min(edge_behind(rain, to_ms - 1), rain.own_steps);
    if (first >= end) return std::nullopt;
    return ElementRun{first, end};
}

bool is_taken_as_dry(const Hyetograph& rain, std::size_t step) {
    return std::ranges::binary_search(rain.dry_steps, step);
}

/// A step without data may be long, and there is no rain in it to be parted.
StepCut cut_at(const Hyetograph& rain, const ElementRun& steps, std::int64_t from_ms,
               std::int64_t to_ms) {
    StepCut cut{steps, {}, {}};
    if (is_taken_as_dry(rain, steps.first) && from_ms > edge_ms(rain, steps.first))
        cut.from_ms = from_ms;
    if (is_taken_as_dry(rain, steps.end - 1) && to_ms < edge_ms(rain, steps.end)) cut.to_ms = to_ms;
    return cut;
}

std::optional<CutRain> cut_between(const Hyetograph& rain, std::int64_t from_ms, std::int64_t to_ms,
                                   const EventSteps& /*steps*/, const EventRule& /*rule*/) {
    const auto steps = steps_within(rain, from_ms, to_ms);
    if (!steps) return std::nullopt;
    CutRain cut;
    cut.rain = cut_out(rain, cut_at(rain, *steps, from_ms, to_ms));
    cut.event = event_of_steps(cut.rain, {0, cut.rain.steps()});
    cut.event.first = steps->first;
    cut.event.end = steps->end;
    return cut;
}

}  // namespace

std::size_t steps_of(const GaugeRecord& record, const RainEvent& event, const EventSteps& steps) {
    if (!record.is_tips()) return event.end - event.first;
    const StepGrid grid = grid_at(std::get<TipLog>(record.rain), event.first, steps);
    return static_cast<std::size_t>((event.to_ms - event.from_ms) / grid.every_ms);
}

std::size_t steps_between(const GaugeRecord& record, std::int64_t from_ms, std::int64_t to_ms,
                          const EventSteps& steps) {
    if (const auto* const log = std::get_if<TipLog>(&record.rain)) {
        const auto window = window_of(*log, from_ms, to_ms, steps);
        return window ? static_cast<std::size_t>(window->end - window->first) : 0;
    }
    const auto within = steps_within(std::get<Hyetograph>(record.rain), from_ms, to_ms);
    return within ? within->end - within->first : 0;
}

Hyetograph event_rain(const GaugeRecord& record, const RainEvent& event, const EventRule& rule,
                      const EventSteps& steps) {
    return std::visit([&](const auto& rain) { return rain_of(rain, event, rule, steps); },
                      record.rain);
}

std::optional<CutRain> rain_between(const GaugeRecord& record, std::int64_t from_ms,
                                    std::int64_t to_ms, const EventSteps& steps,
                                    const EventRule& rule) {
    auto cut =
        std::visit([&](const auto& rain) { return cut_between(rain, from_ms, to_ms, steps, rule); },
                   record.rain);
    if (cut) set_antecedent(cut->event, record, RainBefore(record));
    return cut;
}

}  // namespace rainledger
