#pragma once

#include <string>
#include <vector>

#include "chart/scale.hpp"
#include "rainledger/rain/hyetograph.hpp"

namespace rainledger {

/// A time axis: hours from the first edge of the rain, with round ticks.
struct TimeAxis {
    double span_h = 0.0;
    std::vector<Tick> ticks;
    std::string title;  ///< what the ticks are, with their unit
};

/// The axis of one storm: the clock's face (a date at midnight) where it has timestamps, else
/// elapsed time as given, in h:min, h or d by the distance of the ticks. At most `most_ticks`
/// ticks.
[[nodiscard]] TimeAxis time_axis(const Hyetograph& rain, int most_ticks);

/// The axis that storms of different times share: from the start of each to `span_h` > 0.
[[nodiscard]] TimeAxis shared_time_axis(double span_h, int most_ticks);

/// "25 min", "2 h", "6 h 40 min", "12.5 d": a length of time in few characters.
[[nodiscard]] std::string span_words(double hours);

/// Hours from the first edge to the last.
[[nodiscard]] double span_h(const Hyetograph& rain);

}  // namespace rainledger
