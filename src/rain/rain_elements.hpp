#pragma once

#include <cstddef>
#include <cstdint>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"

// A record as pieces of rain: tips, or the wet steps of interval data.
namespace rainledger {

inline constexpr double kMsPerHour = 3.6e6;

/// The tips of a log. They have no length.
class TipElements {
public:
    explicit TipElements(const TipLog& log) : log_(log) {}

    [[nodiscard]] std::size_t size() const { return log_.unix_ms.size(); }
    [[nodiscard]] double start_h(std::size_t i) const {
        return static_cast<double>(log_.unix_ms[i] - log_.unix_ms.front()) / kMsPerHour;
    }
    [[nodiscard]] double end_h(std::size_t i) const { return start_h(i); }
    [[nodiscard]] double depth_mm(std::size_t i) const { return log_.depth(i); }

private:
    const TipLog& log_;
};

/// The wet steps of interval data; `step` says which they are.
class WetSteps {
public:
    explicit WetSteps(const Hyetograph& rain) : rain_(rain) {
        for (std::size_t i = 0; i < rain.own_steps; ++i)
            if (rain.depth_mm[i] > 0.0) step_.push_back(i);
    }

    [[nodiscard]] std::size_t size() const { return step_.size(); }
    [[nodiscard]] std::size_t step(std::size_t i) const { return step_[i]; }
    [[nodiscard]] double start_h(std::size_t i) const { return rain_.edges_h[step_[i]]; }
    [[nodiscard]] double end_h(std::size_t i) const { return rain_.edges_h[step_[i] + 1]; }
    [[nodiscard]] double depth_mm(std::size_t i) const { return rain_.depth_mm[step_[i]]; }

private:
    const Hyetograph& rain_;
    std::vector<std::size_t> step_;
};

/// An edge of interval data in ms: as StampedEdges, or since elapsed time 0.
[[nodiscard]] std::int64_t edge_ms(const Hyetograph& rain, std::size_t edge);

/// The first edge of the storm's own steps later than an instant; one past the last if none is.
[[nodiscard]] std::size_t edge_behind(const Hyetograph& rain, std::int64_t ms);

}  // namespace rainledger
