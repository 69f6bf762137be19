#include "rainledger/scenario/storm_making.hpp"

#include <utility>

#include "rainledger/rain/rain_events.hpp"
#include "scenario/gauge_clock.hpp"

namespace rainledger {
namespace {

constexpr double kMiddle = 0.5;  // where a peak lies unless it is said

/// The depth or curve that a design is made from, or what stands in the way.
std::optional<std::variant<double, DepthDuration>> depth_for(const DesignWish& wish,
                                                             MadeStorm& made) {
    if (const auto* statistics = std::get_if<RainfallStatistics>(&wish.depth)) {
        ListAnswer answer = depths_of(*statistics, wish.return_period_yr);
        made.problem = std::move(answer.problem);
        made.hint = std::move(answer.hint);
        if (!answer.list) return std::nullopt;
        return DepthDuration{*std::move(answer.list)};
    }
    if (wish.return_period_yr) {
        made.problem = "a return period picks a column of rainfall statistics, and there are none";
        return std::nullopt;
    }
    if (const auto* depth_mm = std::get_if<double>(&wish.depth)) return *depth_mm;
    return std::get<DepthDuration>(wish.depth);
}

DesignOrigin origin_of(const DesignWish& wish, std::vector<HeldStatistic> held) {
    DesignOrigin origin;
    origin.pattern = wish.pattern;
    origin.duration_h = wish.duration_h;
    origin.every_h = wish.every_h;
    if (has_peak(wish.pattern)) {
        origin.peak_at = wish.peak_at.value_or(kMiddle);
        origin.peak_at_assumed = !wish.peak_at;
    }
    origin.return_period_yr = wish.return_period_yr;
    origin.depth_words = wish.depth_words;
    origin.curve_words = wish.curve_words;
    origin.held = std::move(held);
    return origin;
}

}  // namespace

MadeStorm storm_of_design(const DesignWish& wish) {
    MadeStorm made;
    const auto depth = depth_for(wish, made);
    if (!depth) return made;
    DesignRequest request;
    request.pattern = wish.pattern;
    request.duration_h = wish.duration_h;
    request.every_h = wish.every_h;
    request.peak_at = wish.peak_at.value_or(kMiddle);
    request.depth = *depth;
    request.curve = wish.curve;
    DesignStorm design = make_design_storm(request);
    made.problem = std::move(design.problem);
    made.hint = std::move(design.hint);
    made.warnings = std::move(design.warnings);
    if (!design.rain) return made;
    Storm storm;
    storm.name = "storm";
    storm.rain = *std::move(design.rain);
    storm.origin = origin_of(wish, std::move(design.held));
    made.storm = std::move(storm);
    return made;
}

Storm storm_of_event(const GaugeRecord& record, const RecordEvents& events, const RainEvent& event,
                     const RecordSource& source, const RainfallStatistics* statistics) {
    Storm storm;
    storm.name = event_name(record, event);
    storm.rain = event_rain(record, event, source.rule, source.steps);
    EventOrigin origin{source, event, events.events.size(), std::nullopt};
    if (statistics != nullptr) origin.rarity = rarity_of(storm.rain, *statistics);
    storm.origin = std::move(origin);
    storm.file = record.file;
    storm.files.push_back(source.path);
    if (source.statistics_path) storm.files.push_back(*source.statistics_path);
    return storm;
}

std::string event_name(const GaugeRecord& record, const RainEvent& event) {
    if (!is_stamped(record)) return "event " + std::to_string(event.number);
    return start_text(record, event);
}

void resample_storm(Storm& storm, double every_h) {
    ResampledRain resampled = resample(storm.rain, every_h);
    storm.rain = std::move(resampled.rain);
    storm.resampled =
        ResampledFrom{every_h, resampled.peak_before_mm_per_h, resampled.peak_after_mm_per_h};
}

}  // namespace rainledger
