#pragma once

#include <cstddef>
#include <vector>

#include "rainledger/rain/hyetograph.hpp"

// Largest depths in sliding windows over a series of steps.
namespace rainledger {

/// Cumulative depth over steps of constant rate from time 0, dry outside them. Built once, it
/// answers for any number of windows.
class CumulativeDepth {
public:
    /// Without steps yet; `steps` is how many are coming.
    explicit CumulativeDepth(std::size_t steps);
    /// The storm's own steps.
    explicit CumulativeDepth(const Hyetograph& rain);

    /// Appends a step, `duration_h` > 0.
    void add_step(double duration_h, double depth_mm);

    /// The largest depth in any window of `window_h` > 0. Exact: the depth in a sliding window is
    /// piecewise linear, so its largest value is met with the window's start or end on an edge.
    [[nodiscard]] double largest_depth_mm(double window_h) const;

private:
    [[nodiscard]] double depth_at(double time_h, std::size_t& step) const;

    std::vector<double> time_h_;
    std::vector<double> depth_mm_;
};

/// The largest depth in any window of `window_h` > 0 over a storm's own steps.
[[nodiscard]] double largest_window_depth_mm(const Hyetograph& rain, double window_h);

}  // namespace rainledger
