#include "rainledger/fieldtest/least_squares.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "fieldtest/minimum.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kMostBounds = 6;
constexpr double kStationary = 1.0e-6;  // cosine of an angle: within rounding of a right one
constexpr double kExact = 1.0e-12;      // residuals over observations, both as lengths
/// Sums of squares that differ by less are one, and the fit with fewer free parameters is taken;
/// of two with as many, the earlier.
constexpr double kSameSum = 1.0e-9;
/// Beyond this the covariance has lost its digits.
constexpr double kMostCondition = 1.0e8;

bool all_finite(std::span<const double> values) {
    return std::ranges::all_of(values, [](double value) { return std::isfinite(value); });
}

bool within(const LeastSquaresProblem& problem, std::span<const double> start) {
    if (start.size() != problem.ranges.size()) return false;
    for (std::size_t j = 0; j < start.size(); ++j)
        if (!(start[j] >= problem.ranges[j].low && start[j] <= problem.ranges[j].high))
            return false;
    return true;
}

std::string problem_of(const LeastSquaresProblem& problem) {
    const auto to_fit = std::ranges::count_if(
        problem.ranges, [](const ParameterRange& range) { return range.low != range.high; });
    if (std::ssize(problem.observed) < to_fit)
        return "there are fewer observations than parameters";
    if (!all_finite(problem.observed)) return "an observation is not a finite number";
    if (problem.starts.empty()) return "there is no start";
    for (const auto& start : problem.starts)
        if (!all_finite(start) || !within(problem, start))
            return "a start does not lie within the ranges";
    return {};
}

double sum_of_squares(std::span<const double> values) {
    double sum = 0.0;
    for (const double value : values)
        sum += value * value;
    return sum;
}

/// A bound that can be tried.
struct Bound {
    std::size_t parameter;
    Standing side;
    double value;
};

std::vector<Bound> finite_bounds(const LeastSquaresProblem& problem) {
    std::vector<Bound> bounds;
    for (std::size_t j = 0; j < problem.ranges.size(); ++j) {
        const ParameterRange range = problem.ranges[j];
        if (range.low == range.high) continue;
        if (std::isfinite(range.low)) bounds.push_back({j, Standing::at_low, range.low});
        if (std::isfinite(range.high)) bounds.push_back({j, Standing::at_high, range.high});
    }
    return bounds;
}

using Standings = std::vector<Standing>;

/// Every combination of parameters on bounds, the one with the fewest first. A parameter whose
/// range is one value stands on it throughout.
std::vector<Standings> faces_of(const LeastSquaresProblem& problem, std::span<const Bound> bounds) {
    Standings inside;
    for (const ParameterRange& range : problem.ranges)
        inside.push_back(range.low == range.high ? Standing::at_low : Standing::inside);
    std::vector<Standings> faces{inside};
    for (const Bound& bound : bounds) {
        const std::size_t before = faces.size();
        for (std::size_t i = 0; i < before; ++i) {
            if (faces[i][bound.parameter] != Standing::inside) continue;
            faces.push_back(faces[i]);
            faces.back()[bound.parameter] = bound.side;
        }
    }
    return faces;
}

std::size_t inside_count(const Standings& standing) {
    return static_cast<std::size_t>(std::ranges::count(standing, Standing::inside));
}

struct Candidate {
    Standings standing;
    std::vector<double> parameters;
    double sum = std::numeric_limits<double>::infinity();
};

class Fitter {
public:
    explicit Fitter(const LeastSquaresProblem& problem) : problem_(problem) {
        exact_sum_ = kExact * kExact * sum_of_squares(problem.observed);
    }

    [[nodiscard]] LeastSquaresAnswer fit() const;

private:
    [[nodiscard]] Candidate best_on(const Standings& standing) const;
    [[nodiscard]] bool better(const Candidate& candidate, const Candidate& best) const;
    [[nodiscard]] LeastSquaresFit describe(const Candidate& best) const;
    void add_covariance(LeastSquaresFit& fit, const ScaledSlopes& slopes,
                        std::span<const std::size_t> free) const;

    const LeastSquaresProblem& problem_;
    double exact_sum_ = 0.0;
};

Candidate Fitter::best_on(const Standings& standing) const {
    Candidate best;
    best.standing = standing;
    for (std::vector<double> start : problem_.starts) {
        for (std::size_t j = 0; j < standing.size(); ++j) {
            if (standing[j] == Standing::at_low) start[j] = problem_.ranges[j].low;
            if (standing[j] == Standing::at_high) start[j] = problem_.ranges[j].high;
        }
        const auto found = minimum_from(problem_, standing, std::move(start));
        if (!found || !(found->sum < best.sum)) continue;
        best.sum = found->sum;
        best.parameters = found->parameters;
    }
    return best;
}

bool Fitter::better(const Candidate& candidate, const Candidate& best) const {
    if (!std::isfinite(candidate.sum)) return false;
    if (!std::isfinite(best.sum)) return true;
    const double room = kSameSum * std::max(candidate.sum, best.sum) + exact_sum_;
    if (std::abs(candidate.sum - best.sum) > room) return candidate.sum < best.sum;
    return inside_count(candidate.standing) < inside_count(best.standing);
}

void Fitter::add_covariance(LeastSquaresFit& fit, const ScaledSlopes& slopes,
                            std::span<const std::size_t> free) const {
    if (!fit.residual_deviation || slopes.condition > kMostCondition) return;
    const std::size_t n = fit.parameters.size();
    const double variance = *fit.residual_deviation * *fit.residual_deviation;
    fit.covariance.assign(n * n, 0.0);
    for (std::size_t a = 0; a < free.size(); ++a)
        for (std::size_t b = 0; b < free.size(); ++b)
            fit.covariance[free[a] * n + free[b]] =
                variance * slopes.inverse_square[a * free.size() + b];
}

LeastSquaresFit Fitter::describe(const Candidate& best) const {
    LeastSquaresFit fit;
    fit.parameters = best.parameters;
    fit.standing = best.standing;
    fit.residual_sum = best.sum;
    fit.values = std::vector<double>(problem_.observed.size());
    problem_.model(fit.parameters, fit.values);
    std::vector<std::size_t> free;
    for (std::size_t j = 0; j < best.standing.size(); ++j)
        if (best.standing[j] == Standing::inside) free.push_back(j);
    fit.degrees_of_freedom = problem_.observed.size() - free.size();
    if (fit.degrees_of_freedom > 0)
        fit.residual_deviation = std::sqrt(best.sum / static_cast<double>(fit.degrees_of_freedom));
    const ScaledSlopes slopes = scaled_slopes(problem_, fit.parameters, free);
    fit.condition = slopes.condition;
    fit.gradient_cosine = slopes.gradient_cosine;
    fit.converged = fit.gradient_cosine <= kStationary || fit.residual_sum <= exact_sum_;
    add_covariance(fit, slopes, free);
    return fit;
}

LeastSquaresAnswer Fitter::fit() const {
    const auto bounds = finite_bounds(problem_);
    if (bounds.size() > kMostBounds) return {{}, "there are more than 6 finite bounds"};
    Candidate best;
    for (const Standings& standing : faces_of(problem_, bounds)) {
        Candidate candidate = best_on(standing);
        if (better(candidate, best)) best = std::move(candidate);
    }
    if (!std::isfinite(best.sum)) return {{}, "the model has no finite values at any start"};
    return {describe(best), {}};
}

}  // namespace

std::optional<double> standard_error(const LeastSquaresFit& fit, std::size_t parameter) {
    const std::size_t n = fit.parameters.size();
    if (fit.covariance.empty() || fit.standing[parameter] != Standing::inside) return std::nullopt;
    return std::sqrt(fit.covariance[parameter * n + parameter]);
}

LeastSquaresAnswer fit_least_squares(const LeastSquaresProblem& problem) {
    std::string trouble = problem_of(problem);
    if (!trouble.empty()) return {{}, std::move(trouble)};
    return Fitter(problem).fit();
}

}  // namespace rainledger
