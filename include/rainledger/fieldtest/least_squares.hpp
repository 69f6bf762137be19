#pragma once

#include <cstddef>
#include <functional>
#include <limits>
#include <optional>
#include <span>
#include <string>
#include <vector>

// Nonlinear least squares with closed bounds: the Levenberg-Marquardt method (Levenberg 1944;
// Marquardt 1963; after Moré 1978, "The Levenberg-Marquardt algorithm, implementation and theory",
// all from memory) with a step factor of 1, from every start that the caller gives. No random
// numbers: the same problem gives the same fit.
namespace rainledger {

/// The closed range of a parameter; one value where the ends are equal.
struct ParameterRange {
    double low = -std::numeric_limits<double>::infinity();
    double high = std::numeric_limits<double>::infinity();
};

/// A model to be fitted to observed values, all of equal weight. `model` writes one value per
/// observation; `slopes` writes the derivative of value i by parameter j at [i * parameters + j].
/// Both are asked within the ranges only.
struct LeastSquaresProblem {
    std::vector<double> observed;
    std::vector<ParameterRange> ranges;       ///< one per parameter
    std::vector<std::vector<double>> starts;  ///< at least one; each within the ranges
    std::function<void(std::span<const double> parameters, std::span<double> values)> model;
    std::function<void(std::span<const double> parameters, std::span<double> slopes)> slopes;
};

/// Where a fitted parameter stands in its range.
enum class Standing { inside, at_low, at_high };

/// A fit. Errors of the observations are taken as independent and of one unknown variance.
struct LeastSquaresFit {
    std::vector<double> parameters;
    std::vector<Standing> standing;      ///< one per parameter
    std::vector<double> values;          ///< of the model, one per observation
    double residual_sum = 0.0;           ///< of squares of observed - value
    std::size_t degrees_of_freedom = 0;  ///< observations - parameters inside their ranges
    /// sqrt(residual_sum/degrees_of_freedom); nothing with no degrees of freedom.
    std::optional<double> residual_deviation = {};
    /// Parameters by parameters, row by row; rows of parameters on a bound are zero. Empty with no
    /// degrees of freedom, or where the observations do not tell the parameters apart.
    std::vector<double> covariance;
    /// Largest cosine of the angle between the residuals and a column of the slopes of the
    /// parameters inside their ranges: zero where the sum of squares is stationary.
    double gradient_cosine = 0.0;
    /// Ratio of the largest to the smallest singular value of those slopes, columns scaled to
    /// length 1. Infinite where they are dependent.
    double condition = 1.0;
    bool converged = false;  ///< stationary, or an exact fit
};

/// Square root of a diagonal entry of the covariance; nothing where there is none.
[[nodiscard]] std::optional<double> standard_error(const LeastSquaresFit& fit,
                                                   std::size_t parameter);

/// A fit, or why there is none.
struct LeastSquaresAnswer {
    std::optional<LeastSquaresFit> fit;
    std::string problem;
};

/// The least sum of squares over the closed ranges. Every combination of parameters on their finite
/// bounds is tried too, with the others fitted; a combination wins when it is at least as good as
/// the fit inside. At most 6 finite bounds. Fewer observations than parameters are refused, and so
/// are observations, starts or model values that are not finite.
[[nodiscard]] LeastSquaresAnswer fit_least_squares(const LeastSquaresProblem& problem);

}  // namespace rainledger
