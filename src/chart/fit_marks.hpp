#pragma once

#include <cstddef>
#include <span>
#include <vector>

#include "chart/drawing.hpp"

// Marks of readings: a shape of its own for each pit, of the same size in every kind of picture.
namespace rainledger {

/// A place in a panel, in the units of its axes.
struct PanelPoint {
    double x = 0.0;
    double y = 0.0;
};

inline constexpr double kMarkRadius = 3.4;

/// Marks of a pit as layers: a shape filled with ink, or with paper from the sixth pit on.
[[nodiscard]] std::vector<Layer> marks(std::span<const PanelPoint> points, std::size_t pit,
                                       const Panel& panel);

}  // namespace rainledger
