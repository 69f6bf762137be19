#include <algorithm>
#include <cmath>
#include <limits>

#include "fieldtest/law_model.hpp"
#include "rainledger/losses/green_ampt.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kGridPoints = 40;
constexpr std::size_t kMostStarts = 3;

/// The shape parameter of a law and the functions of time that the depth is a sum of.
struct Shape {
    double low;  // of the grid
    double high;
    bool by_ratio;  // steps of equal ratio instead of equal difference
    std::size_t terms;
};

struct Extent {
    double shortest_h = std::numeric_limits<double>::infinity();
    double longest_h = 0.0;
};

Extent extent_of(std::span<const DepthSpan> spans) {
    Extent extent;
    for (const DepthSpan& span : spans) {
        extent.shortest_h = std::min(extent.shortest_h, span.to_h - span.from_h);
        extent.longest_h = std::max(extent.longest_h, span.to_h);
    }
    return extent;
}

/// A Horton curve that has decayed by exp(-20) within the shortest span: the readings cannot tell
/// it from a faster one.
double fastest_decay(const Extent& extent) {
    constexpr double kGone = 20.0;
    return kGone / extent.shortest_h;
}

Shape shape_of(FieldLaw law, const Extent& extent) {
    switch (law) {
        case FieldLaw::horton:
            return {0.05 / extent.longest_h, fastest_decay(extent), true, 2};
        case FieldLaw::green_ampt:  // K/S
            return {1.0e-4 / extent.longest_h, 1.0e2 / extent.shortest_h, true, 1};
        case FieldLaw::philip:
            return {0.5, 0.5, false, 2};
        case FieldLaw::kostiakov:
            return {0.05, 1.5, false, 1};
        case FieldLaw::modified_kostiakov:
            break;
    }
    return {0.05, 0.95, false, 2};
}

using Terms = std::array<double, 2>;

/// The functions of time at one shape. A single one leaves the second 0.
Terms terms_at(FieldLaw law, double shape, double t) {
    if (t == 0.0) return {};
    switch (law) {
        case FieldLaw::horton:
            return {-std::expm1(-shape * t) / shape, t};
        case FieldLaw::green_ampt:
            return {green_ampt_cumulative(shape, 1.0, t), 0.0};
        case FieldLaw::kostiakov:
            return {std::pow(t, shape), 0.0};
        case FieldLaw::philip:
        case FieldLaw::modified_kostiakov:
            break;
    }
    return {std::pow(t, shape), t};
}

/// Normal equations of the two terms.
struct Normal {
    double aa = 0.0, ab = 0.0, bb = 0.0, ad = 0.0, bd = 0.0, dd = 0.0;

    [[nodiscard]] double residual(double a, double b) const {
        return dd - 2.0 * (a * ad + b * bd) + a * a * aa + 2.0 * a * b * ab + b * b * bb;
    }
};

Normal normal_of(FieldLaw law, double shape, std::span<const DepthSpan> spans) {
    Normal sums;
    for (const DepthSpan& span : spans) {
        const Terms to = terms_at(law, shape, span.to_h);
        const Terms from = terms_at(law, shape, span.from_h);
        const double a = to[0] - from[0];
        const double b = to[1] - from[1];
        sums.aa += a * a;
        sums.ab += a * b;
        sums.bb += b * b;
        sums.ad += a * span.depth_mm;
        sums.bd += b * span.depth_mm;
        sums.dd += span.depth_mm * span.depth_mm;
    }
    return sums;
}

struct GridPoint {
    double shape = 0.0;
    Terms weight{};
    double residual = 0.0;
};

/// The best weights >= 0 of the terms; one that would be negative is set to a hundredth of what it
/// would be alone, so that a start does not stand on a bound.
GridPoint solve_at(FieldLaw law, double shape, std::size_t terms,
                   std::span<const DepthSpan> spans) {
    constexpr double kLittle = 0.01;
    const Normal sums = normal_of(law, shape, spans);
    const double a_alone = sums.ad / sums.aa;
    if (terms == 1) return {shape, {a_alone, 0.0}, sums.residual(a_alone, 0.0)};
    const double b_alone = sums.bd / sums.bb;
    const double determinant = sums.aa * sums.bb - sums.ab * sums.ab;
    const double a = (sums.ad * sums.bb - sums.bd * sums.ab) / determinant;
    const double b = (sums.bd * sums.aa - sums.ad * sums.ab) / determinant;
    if (a > 0.0 && b > 0.0) return {shape, {a, b}, sums.residual(a, b)};
    const double without_a = sums.residual(0.0, b_alone);
    const double without_b = sums.residual(a_alone, 0.0);
    if (without_a < without_b) return {shape, {kLittle * a_alone, b_alone}, without_a};
    return {shape, {a_alone, kLittle * b_alone}, without_b};
}

std::vector<double> own_parameters(FieldLaw law, const GridPoint& point) {
    const auto [a, b] = point.weight;
    switch (law) {
        case FieldLaw::horton:
            return {a, b, point.shape};
        case FieldLaw::green_ampt:
            return {point.shape * a, 2.0 * point.shape * a * a};
        case FieldLaw::philip:
            return {a, b};
        case FieldLaw::kostiakov:
            return {a, point.shape};
        case FieldLaw::modified_kostiakov:
            break;
    }
    return {a, point.shape, b};
}

std::vector<GridPoint> grid_of(FieldLaw law, std::span<const DepthSpan> spans) {
    const Shape shape = shape_of(law, extent_of(spans));
    const std::size_t count = law == FieldLaw::philip ? 1 : kGridPoints;
    std::vector<GridPoint> grid;
    for (std::size_t i = 0; i < count; ++i) {
        const double share = static_cast<double>(i) / static_cast<double>(kGridPoints - 1);
        const double value = shape.by_ratio ? shape.low * std::pow(shape.high / shape.low, share)
                                            : shape.low + share * (shape.high - shape.low);
        // A curve that has run out before the first span has no weight that fits.
        const GridPoint point = solve_at(law, value, shape.terms, spans);
        const std::vector<double> own = own_parameters(law, point);
        const bool finite = std::ranges::all_of(own, [](double p) { return std::isfinite(p); });
        if (finite && std::isfinite(point.residual)) grid.push_back(point);
    }
    return grid;
}

/// The points that no neighbour beats, best first.
std::vector<GridPoint> hollows(const std::vector<GridPoint>& grid) {
    std::vector<GridPoint> found;
    for (std::size_t i = 0; i < grid.size(); ++i) {
        const bool beaten = (i > 0 && grid[i - 1].residual < grid[i].residual) ||
                            (i + 1 < grid.size() && grid[i + 1].residual < grid[i].residual);
        if (!beaten) found.push_back(grid[i]);
    }
    std::ranges::stable_sort(found, {}, &GridPoint::residual);
    found.resize(std::min(found.size(), kMostStarts));
    return found;
}

}  // namespace

std::vector<ParameterRange> law_ranges(FieldLaw law, std::span<const DepthSpan> spans) {
    std::vector<ParameterRange> ranges(law_parameter_count(law));
    for (ParameterRange& range : ranges)
        range.low = 0.0;
    if (law == FieldLaw::horton) ranges[2].high = fastest_decay(extent_of(spans));
    if (law == FieldLaw::modified_kostiakov) ranges[1].high = 1.0;
    return ranges;
}

std::vector<std::vector<double>> law_starts(FieldLaw law, std::span<const DepthSpan> spans) {
    const std::vector<ParameterRange> ranges = law_ranges(law, spans);
    std::vector<std::vector<double>> starts;
    for (const GridPoint& point : hollows(grid_of(law, spans))) {
        starts.push_back(own_parameters(law, point));
        for (std::size_t j = 0; j < ranges.size(); ++j)  // the last grid point, up to a rounding
            starts.back()[j] = std::clamp(starts.back()[j], ranges[j].low, ranges[j].high);
    }
    return starts;
}

}  // namespace rainledger
