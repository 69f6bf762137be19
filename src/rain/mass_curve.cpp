#include "rainledger/rain/mass_curve.hpp"

#include <algorithm>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

bool is_share(double value) {
    return value >= 0.0 && value <= 1.0;
}

/// What is wrong with point `i` by itself or after the one before it; empty if nothing.
std::string point_problem(std::span<const MassPoint> points, std::size_t i) {
    const MassPoint& here = points[i];
    if (!is_share(here.time) || !is_share(here.depth))
        return "time and depth of a mass curve must lie from 0 to 1";
    if (i == 0)
        return here.time == 0.0 && here.depth == 0.0
                   ? ""
                   : "a mass curve must begin with time 0 and depth 0";
    const MassPoint& before = points[i - 1];
    if (!(here.time > before.time))
        return "time " + shortest(here.time) + " is not later than the time before it, " +
               shortest(before.time);
    if (here.depth < before.depth)
        return "depth " + shortest(here.depth) + " is less than the depth before it, " +
               shortest(before.depth) + "; rain cannot be negative";
    return "";
}

/// The slope at a point between two stretches of lengths h and mean slopes m.
double inner_slope(double h_before, double h_after, double m_before, double m_after) {
    if (!(m_before > 0.0) || !(m_after > 0.0)) return 0.0;
    const double weight_before = 2.0 * h_after + h_before;
    const double weight_after = h_after + 2.0 * h_before;
    return (weight_before + weight_after) / (weight_before / m_before + weight_after / m_after);
}

/// The slope at an end, from its own stretch and the next one.
double end_slope(double h_own, double h_next, double m_own, double m_next) {
    return std::max(0.0, ((2.0 * h_own + h_next) * m_own - h_own * m_next) / (h_own + h_next));
}

/// A value `share` of the way from one to the other, `rest` being 1 - share: exact at both ends and
/// where they are equal.
double between(double from, double to, double share, double rest) {
    return share <= rest ? from + (to - from) * share : to - (to - from) * rest;
}

std::vector<double> monotone_slopes(std::span<const MassPoint> points) {
    const std::size_t stretches = points.size() - 1;
    std::vector<double> h(stretches);
    std::vector<double> m(stretches);
    for (std::size_t i = 0; i < stretches; ++i) {
        h[i] = points[i + 1].time - points[i].time;
        m[i] = (points[i + 1].depth - points[i].depth) / h[i];
    }
    if (stretches == 1) return {m[0], m[0]};
    std::vector<double> slope;
    slope.reserve(points.size());
    slope.push_back(end_slope(h[0], h[1], m[0], m[1]));
    for (std::size_t i = 1; i < stretches; ++i)
        slope.push_back(inner_slope(h[i - 1], h[i], m[i - 1], m[i]));
    slope.push_back(
        end_slope(h[stretches - 1], h[stretches - 2], m[stretches - 1], m[stretches - 2]));
    return slope;
}

}  // namespace

std::optional<MassPointProblem> mass_curve_problem(std::span<const MassPoint> points) {
    if (points.size() < 2) return MassPointProblem{0, "a mass curve needs at least two points"};
    for (std::size_t i = 0; i < points.size(); ++i)
        if (std::string problem = point_problem(points, i); !problem.empty())
            return MassPointProblem{i, std::move(problem)};
    if (points.back().time != 1.0 || points.back().depth != 1.0)
        return MassPointProblem{points.size() - 1, "a mass curve must end with time 1 and depth 1"};
    return std::nullopt;
}

MassCurve::MassCurve(std::span<const MassPoint> points, BetweenPoints how)
    : points_(points.begin(), points.end()) {
    if (how == BetweenPoints::smooth) slope_ = monotone_slopes(points_);
}

double MassCurve::depth_at(double time) const {
    const auto inner_end = points_.end() - 1;
    const auto next =
        std::upper_bound(points_.begin() + 1, inner_end, time,
                         [](double value, const MassPoint& point) { return value < point.time; });
    const MassPoint& from = *(next - 1);
    const MassPoint& to = *next;
    const double h = to.time - from.time;
    const double u = (time - from.time) / h;
    const double v = (to.time - time) / h;
    if (slope_.empty()) return between(from.depth, to.depth, u, v);
    const auto i = static_cast<std::size_t>(next - points_.begin());
    const double bend = h * u * v * (slope_[i - 1] * v - slope_[i] * u);
    return between(from.depth, to.depth, u * u * (1.0 + 2.0 * v), v * v * (1.0 + 2.0 * u)) + bend;
}

}  // namespace rainledger
