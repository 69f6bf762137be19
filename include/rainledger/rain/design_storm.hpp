#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/rain/depth_duration.hpp"
#include "rainledger/rain/hyetograph.hpp"
#include "rainledger/rain/mass_curve.hpp"

// Design storms: a depth of rain, or a curve of depths by duration, given a shape in time.
namespace rainledger {

enum class StormPattern { uniform, triangular, alternating_blocks, keifer_chu, mass_curve };

/// Whether a pattern has a peak to place.
[[nodiscard]] bool has_peak(StormPattern pattern);

/// A design storm to be made. Which members count depends on the pattern:
/// - uniform: the depth, spread evenly;
/// - triangular: intensity rises to 2 P / T at peak_at and falls to 0 (Yen and Chow, Design
///   hyetographs for small drainage structures, 1980);
/// - alternating_blocks: a curve (Chow, Maidment and Mays, Applied Hydrology, 1988, section 14.4);
/// - keifer_chu: a curve that is a formula (Keifer and Chu, Synthetic storm pattern for drainage
///   design, 1957), integrated exactly over each step;
/// - mass_curve: the depth, by the curve.
struct DesignRequest {
    StormPattern pattern = StormPattern::alternating_blocks;
    double duration_h = 0.0;  ///< > 0
    double every_h = 0.0;     ///< > 0; the last step in time is shorter where it does not divide
    double peak_at = 0.5;     ///< share of the duration, 0 to 1; triangular, blocks, Keifer-Chu
    /// The storm's total depth in mm (> 0), or depths by duration from which it follows.
    std::variant<double, DepthDuration> depth;
    std::optional<MassCurve> curve;  ///< for mass_curve
};

/// A duration whose statistic the storm should hold, and what it holds.
struct HeldStatistic {
    double duration_h = 0.0;
    double statistic_mm = 0.0;
    double storm_mm = 0.0;  ///< largest depth in a window of that duration
};

/// A design storm, or why it cannot be made.
struct DesignStorm {
    std::optional<Hyetograph> rain;  ///< edges in min from 0
    std::string problem;             ///< empty when there is rain
    std::string hint;
    double depth_mm = 0.0;            ///< total
    std::vector<HeldStatistic> held;  ///< blocks: for whole numbers of steps; see below
    /// A step that does not divide the duration, or is longer than the shortest tabulated one
    /// (for every pattern but the uniform one); blocks that would not fall with the duration.
    std::vector<std::string> warnings;
};

/// Makes the storm. Steps of every_h from 0; total depth exact, and each step's depth the integral
/// of the shape over it. At most a million steps, none shorter than 1 ms or longer than the storm;
/// a step divides the duration where it does so to 1e-9. Edges are whole minutes to the last bit
/// where the step is one.
///
/// Problems, each with a hint: values outside their range; a pattern without what it needs (one
/// depth for a pattern by duration, a list for Keifer and Chu, no curve for a mass curve); a depth
/// that the curve does not give.
///
/// Alternating blocks: the n-th block's depth is the curve's at n steps less that at n - 1 steps,
/// in falling order; the largest lies in the step that holds the instant peak_at * duration (the
/// earlier one where that is an edge), the next ones right, left, right, ..., the rest on whichever
/// side is left. Where the step does not divide the duration, the shorter last step takes what the
/// curve adds after the last whole one, and a peak that would lie in it lies in the step before.
/// `held` lists the tabulated durations (of a formula: 5, 10, 15, 30, 60 min and 2, 3, 6, 12, 24 h)
/// that are whole numbers of steps and no longer than the storm.
///
/// Keifer and Chu: with D(t) = t i(t) for i = a / (t^m + b)^n, any m and n, a depth of r D(tb / r)
/// falls in the tb before the peak and (1 - r) D(ta / (1 - r)) in the ta after it, r = peak_at. The
/// formula needs b > 0, or b = 0 with m n < 1, so that this vanishes at the peak.
[[nodiscard]] DesignStorm make_design_storm(const DesignRequest& request);

}  // namespace rainledger
