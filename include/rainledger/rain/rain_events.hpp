#pragma once

#include <array>
#include <cstddef>
#include <cstdint>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/hyetograph.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"

// Storms out of gauge records: events, their peaks and rarity, and the hyetograph of one.
namespace rainledger {

/// What separates events: a stretch of at least dry_spell_h, from the end of one piece of rain (a
/// tip, which has no length, or a wet step) to the start of another, in which less than
/// threshold_mm fell in all.
///
/// Every stretch of that length in which nothing fell parts the record. With a threshold above 0,
/// stretches with rain in them part what is left between two such: of those that begin behind the
/// same piece, the shortest that is long enough, which holds the least. They are taken least rain
/// first (of equals the longer, then the earlier), each unless a piece of it, or one of the two
/// that bound it, lies inside a stretch already taken; a piece that bounds one may bound the next.
/// So dry spells take as little rain as they can, and an event keeps a weak beginning or end. What
/// then holds less than threshold_mm in all is no event.
///
/// No event has a stretch of at least dry_spell_h with less than threshold_mm between two of its
/// pieces. Lengths are judged to 1e-9 h, depths to 1e-9 mm.
struct EventRule {
    double dry_spell_h = 6.0;   ///< > 0
    double threshold_mm = 0.0;  ///< >= 0
};

/// How the tips of an event become steps. Interval data keep their own steps.
struct EventSteps {
    /// > 0, taken in whole milliseconds; counted from the midnight of the gauge's clock before the
    /// first tip, by that tip's UTC offset. A tip tells of rain that fell before it, so one just on
    /// an edge belongs to the step that ends there.
    double every_h = 5.0 / 60.0;
    /// The depth of a tip is spread evenly since the tip before it in the event, instead of falling
    /// in the step that holds it; tips of one instant as one. An event's first tip takes as long as
    /// its second, and a lone one a step; never longer than the dry spell.
    bool spread_tips = false;
};

/// More steps than this are too many to make: `every_h` is too short for the time asked for.
inline constexpr std::size_t kMostEventSteps = 10'000'000;

/// Windows of an event's peaks in minutes: up to the hour, and the day.
inline constexpr std::array<int, 6> kEventWindowsMinutes{5, 10, 15, 30, 60, 1440};

/// One event. Peaks are of its own rain, as steps.
struct RainEvent {
    std::size_t number = 0;    ///< from 1, by time
    std::int64_t from_ms = 0;  ///< first edge of its steps, as in StampedEdges
    std::int64_t to_ms = 0;    ///< last edge
    double depth_mm = 0.0;
    std::array<double, kEventWindowsMinutes.size()> peak_mm{};
    double antecedent_5_day_mm = 0.0;  ///< in the 120 h before from_ms
    /// False where the record begins less than 120 h before the event.
    bool antecedent_known = true;
    double without_data_h = 0.0;  ///< of its duration, taken as dry
    /// Its tips, or in interval data its steps: the first, and one past the last.
    std::size_t first = 0;
    std::size_t end = 0;
};

/// The events of a record in order of time, and the rain outside them. Takes time and memory by the
/// rows of the record, whatever the length of its steps; a threshold above 0 has rows sorted.
struct RecordEvents {
    std::vector<RainEvent> events;
    double outside_mm = 0.0;  ///< in dry spells, or too little; events + outside = all rain
};
[[nodiscard]] RecordEvents find_events(const GaugeRecord& record, const EventRule& rule,
                                       const EventSteps& steps);

/// The steps that the rain of an event, or between two instants, would have. The caller refuses
/// more than kMostEventSteps before asking for the rain itself.
[[nodiscard]] std::size_t steps_of(const GaugeRecord& record, const RainEvent& event,
                                   const EventSteps& steps);
[[nodiscard]] std::size_t steps_between(const GaugeRecord& record, std::int64_t from_ms,
                                        std::int64_t to_ms, const EventSteps& steps);

/// The rain of an event that find_events found in this record by this rule and these steps, as a
/// hyetograph whose edges run from event.from_ms to to_ms (of a log without offsets on the clock's
/// face). Depths add up to the event's. Stamped; interval data of elapsed times keep those. An edge
/// has the UTC offset of the last tip at or before it, else of the event's first; interval data
/// keep theirs, and what was taken as dry.
[[nodiscard]] Hyetograph event_rain(const GaugeRecord& record, const RainEvent& event,
                                    const EventRule& rule, const EventSteps& steps);

/// All rain between two instants as a hyetograph and as an event (number 0), whatever the dry
/// spells; from_ms < to_ms are cut to the record's first and last instant and moved outward to
/// edges of its steps. A step of interval data that was taken as dry is cut at from_ms or to_ms
/// instead: it holds no rain, and a hole may be longer than the stretch. The new edge has the UTC
/// offset of the last old edge before it. Nothing where the record holds no time in the stretch.
/// With spread tips, the first is spread no further back than the first edge, and none longer than
/// the rule's dry spell.
struct CutRain {
    RainEvent event;
    Hyetograph rain;
};
[[nodiscard]] std::optional<CutRain> rain_between(const GaugeRecord& record, std::int64_t from_ms,
                                                  std::int64_t to_ms, const EventSteps& steps,
                                                  const EventRule& rule = {});

/// How rare an event was, per duration of the statistics that is no longer than the event, and at
/// least the shortest (judged to 1e-9 h).
struct DurationRarity {
    double duration_h = 0.0;
    double depth_mm = 0.0;  ///< the event's largest in a window of that duration
    Rarity rarity;
};
struct EventRarity {
    std::vector<DurationRarity> by_duration;
    std::size_t rarest =
        0;  ///< index of the longest return period; the shortest duration of equals
};
[[nodiscard]] EventRarity rarity_of(const Hyetograph& rain, const RainfallStatistics& statistics);

/// Rain at another step.
struct ResampledRain {
    Hyetograph rain;  ///< steps of every_h from the first edge; total depth kept
    double peak_before_mm_per_h = 0.0;
    double peak_after_mm_per_h = 0.0;
};
/// Resamples a storm's own steps at every_h > 0, each step's rain falling evenly within it. The
/// last step may reach beyond the rain. Edges are first + k every_h in the unit in which the old
/// ones were given, an old edge within 1e-9 h of one counting as that one; stamped edges are
/// rounded to the millisecond and have the UTC offset of the last old edge at or before them. What
/// was taken as dry keeps its total; dry_steps are the new steps of nothing else. The caller bounds
/// the number of steps.
[[nodiscard]] ResampledRain resample(const Hyetograph& rain, double every_h);

}  // namespace rainledger
