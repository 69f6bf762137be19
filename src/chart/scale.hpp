#pragma once

#include <cstddef>
#include <string>
#include <vector>

// Axes with round ticks.
namespace rainledger {

struct Tick {
    double at = 0.0;
    std::string label;
};

/// An axis of a panel; from > to runs the other way.
struct Axis {
    double from = 0.0;
    double to = 1.0;
    std::vector<Tick> ticks;
    bool labelled = true;
};

/// The smallest of 1, 2 and 5 times a power of ten that is not below `least` (> 0).
[[nodiscard]] double round_step(double least);

/// `intervals` + 1 ticks from 0, `step` apart, with as many decimals as the step has.
[[nodiscard]] std::vector<Tick> ticks_of(double step, std::size_t intervals);

/// Ticks from 0 to `most` (>= 0) or beyond, `step` apart; at least one step.
[[nodiscard]] std::vector<Tick> ticks_to(double most, double step);

/// What an axis can measure: `most` within 1e-9 to 1e12, else the nearer of these (what lies beyond
/// leaves the panel); 1 where there is nothing to measure.
[[nodiscard]] double measurable(double most);

/// The same to measurable(most) at a round step that gives about `wanted` intervals.
[[nodiscard]] std::vector<Tick> round_ticks(double most, int wanted);

/// A scale from 0 to a little above measurable(most), with round ticks, about `wanted` intervals.
[[nodiscard]] Axis scale_axis(double most, int wanted);

/// The same with ticks a given step apart.
[[nodiscard]] Axis stepped_axis(double most, double step);

/// A scale for another measure up to `most` whose ticks stand level with those of `axis`.
[[nodiscard]] Axis matching_axis(double most, const Axis& axis);

}  // namespace rainledger
