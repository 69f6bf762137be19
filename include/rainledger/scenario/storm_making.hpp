#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/rain/rainfall_statistics.hpp"
#include "rainledger/scenario/scenario.hpp"

// Storms made from designs and from events of a record, for whoever has the parts at hand.
namespace rainledger {

/// A design storm as asked for.
struct DesignWish {
    StormPattern pattern = StormPattern::alternating_blocks;
    double duration_h = 0.0;
    double every_h = 0.0;
    std::optional<double> peak_at;           ///< 0.5 unless given, where the pattern has one
    std::optional<double> return_period_yr;  ///< needed for statistics, refused otherwise
    std::variant<double, DepthDuration, RainfallStatistics>
        depth;                       ///< a total in mm, or the source
    std::string depth_words;         ///< as in DesignOrigin
    std::optional<MassCurve> curve;  ///< for the pattern mass_curve
    std::string curve_words;
};

/// A storm, or why it cannot be made.
struct MadeStorm {
    std::optional<Storm> storm;
    std::string problem;  ///< empty when there is a storm
    std::string hint;
    std::vector<std::string> warnings;
};

/// The design storm, named "storm", with a DesignOrigin.
[[nodiscard]] MadeStorm storm_of_design(const DesignWish& wish);

/// The storm of an event, named by its start, with an EventOrigin; `statistics` may be null.
[[nodiscard]] Storm storm_of_event(const GaugeRecord& record, const RecordEvents& events,
                                   const RainEvent& event, const RecordSource& source,
                                   const RainfallStatistics* statistics);

/// "2031-06-14 13:45": an event's name, by its start on the gauge's clock; "event 3" in a record of
/// elapsed times.
[[nodiscard]] std::string event_name(const GaugeRecord& record, const RainEvent& event);

/// Brings a storm to steps of every_h: rain and `resampled`; before multiply_by and continue_for.
void resample_storm(Storm& storm, double every_h);

}  // namespace rainledger
