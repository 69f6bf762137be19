#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "rainledger/reference/mass_curves.hpp"

// Reading a dimensionless mass curve between its ordinates.
namespace rainledger {

/// How a curve runs between its ordinates.
enum class BetweenPoints {
    linear,
    /// Monotone piecewise cubic: no overshoot, rain never negative. Inner slopes after Fritsch and
    /// Butland, A method for constructing local monotone piecewise cubic interpolants, 1984: the
    /// weighted harmonic mean of the two sides; end slopes from a parabola through three points,
    /// not below 0.
    smooth,
};

/// What is wrong with a list of points, and which of them (from 0) shows it.
struct MassPointProblem {
    std::size_t point = 0;
    std::string problem;
};

/// The first thing that keeps points from being a mass curve: fewer than two of them; values that
/// are not finite or not within 0 to 1; a start other than (0, 0), an end other than (1, 1); a time
/// that does not rise, a depth that falls. Nothing if they are one.
[[nodiscard]] std::optional<MassPointProblem> mass_curve_problem(std::span<const MassPoint> points);

/// A mass curve ready to be read at any time. The caller has made sure that mass_curve_problem
/// finds nothing in its points.
class MassCurve {
public:
    MassCurve(std::span<const MassPoint> points, BetweenPoints how);
    /// Share of the depth that has fallen by share `time` of the duration, 0 <= time <= 1.
    [[nodiscard]] double depth_at(double time) const;
    [[nodiscard]] std::span<const MassPoint> points() const { return points_; }

private:
    std::vector<MassPoint> points_;
    std::vector<double> slope_;  ///< at the points, for the smooth curve; empty for the linear one
};

}  // namespace rainledger
