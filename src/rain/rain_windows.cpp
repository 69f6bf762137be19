#include "rainledger/rain/rain_windows.hpp"

#include <algorithm>

namespace rainledger {

CumulativeDepth::CumulativeDepth(std::size_t steps) {
    time_h_.reserve(steps + 1);
    depth_mm_.reserve(steps + 1);
    time_h_.push_back(0.0);
    depth_mm_.push_back(0.0);
}

CumulativeDepth::CumulativeDepth(const Hyetograph& rain) : CumulativeDepth(rain.own_steps) {
    for (std::size_t step = 0; step < rain.own_steps; ++step)
        add_step(rain.duration_h[step], rain.depth_mm[step]);
}

void CumulativeDepth::add_step(double duration_h, double depth_mm) {
    time_h_.push_back(time_h_.back() + duration_h);
    depth_mm_.push_back(depth_mm_.back() + depth_mm);
}

double CumulativeDepth::largest_depth_mm(double window_h) const {
    double largest = 0.0;
    std::size_t after = 0;
    std::size_t before = 0;
    for (std::size_t i = 0; i < time_h_.size(); ++i) {
        const double from_here = depth_at(time_h_[i] + window_h, after) - depth_mm_[i];
        const double to_here = depth_mm_[i] - depth_at(time_h_[i] - window_h, before);
        largest = std::max({largest, from_here, to_here});
    }
    return largest;
}

/// `step` remembers where the last look-up ended; times only rise.
double CumulativeDepth::depth_at(double time_h, std::size_t& step) const {
    if (time_h <= 0.0) return 0.0;
    if (time_h >= time_h_.back()) return depth_mm_.back();
    while (time_h_[step + 1] < time_h)
        ++step;
    const double share = (time_h - time_h_[step]) / (time_h_[step + 1] - time_h_[step]);
    return depth_mm_[step] + share * (depth_mm_[step + 1] - depth_mm_[step]);
}

double largest_window_depth_mm(const Hyetograph& rain, double window_h) {
    return CumulativeDepth(rain).largest_depth_mm(window_h);
}

}  // namespace rainledger
