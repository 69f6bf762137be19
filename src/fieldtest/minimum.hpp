#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <vector>

#include "rainledger/fieldtest/least_squares.hpp"

// The linear algebra beneath a fit; the one place that knows Eigen.
namespace rainledger {

struct LocalMinimum {
    std::vector<double> parameters;
    double sum = 0.0;  ///< of squared residuals
};

/// Descends from `start` over the parameters that stand inside; the others keep the start's value.
/// Nothing where the model has no finite values at the start. A step out of the ranges is refused
/// as one that makes the fit worse, so that a descent that wants to leave stops short of the bound.
[[nodiscard]] std::optional<LocalMinimum> minimum_from(const LeastSquaresProblem& problem,
                                                       std::span<const Standing> standing,
                                                       std::vector<double> start);

/// The slopes of some parameters, columns scaled to length 1 inside.
struct ScaledSlopes {
    double condition = 1.0;              ///< infinite where a column is zero
    double gradient_cosine = 0.0;        ///< against the residuals
    std::vector<double> inverse_square;  ///< (J'J)^-1 of the unscaled slopes, row by row
};
[[nodiscard]] ScaledSlopes scaled_slopes(const LeastSquaresProblem& problem,
                                         std::span<const double> parameters,
                                         std::span<const std::size_t> free);

}  // namespace rainledger
