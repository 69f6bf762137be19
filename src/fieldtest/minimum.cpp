#include "fieldtest/minimum.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

#include <Eigen/Core>
#include <Eigen/SVD>
#include <unsupported/Eigen/NonLinearOptimization>

namespace rainledger {
namespace {

constexpr Eigen::Index kMostEvaluations = 4000;
constexpr double kDependent = std::numeric_limits<double>::infinity();
/// Residuals where the model must not go: worse than any, and their squares still finite.
constexpr double kForbidden = 1.0e100;

Eigen::Index index(std::size_t i) {
    return static_cast<Eigen::Index>(i);
}

std::vector<std::size_t> free_parameters(std::span<const Standing> standing) {
    std::vector<std::size_t> free;
    for (std::size_t j = 0; j < standing.size(); ++j)
        if (standing[j] == Standing::inside) free.push_back(j);
    return free;
}

Eigen::MatrixXd slopes_at(const LeastSquaresProblem& problem, std::span<const double> parameters,
                          std::span<const std::size_t> free) {
    const std::size_t n = parameters.size();
    std::vector<double> all(problem.observed.size() * n);
    problem.slopes(parameters, all);
    Eigen::MatrixXd picked(index(problem.observed.size()), index(free.size()));
    for (std::size_t i = 0; i < problem.observed.size(); ++i)
        for (std::size_t a = 0; a < free.size(); ++a)
            picked(index(i), index(a)) = all[i * n + free[a]];
    return picked;
}

/// Value less observation at given parameters.
Eigen::VectorXd residuals_at(const LeastSquaresProblem& problem,
                             std::span<const double> parameters) {
    std::vector<double> values(problem.observed.size());
    problem.model(parameters, values);
    Eigen::VectorXd residuals(index(values.size()));
    for (std::size_t i = 0; i < values.size(); ++i)
        residuals(index(i)) = values[i] - problem.observed[i];
    return residuals;
}

/// What Eigen's method asks of a function.
class Descent {
public:
    Descent(const LeastSquaresProblem& problem, std::vector<std::size_t> free,
            std::vector<double> start)
        : problem_(problem), free_(std::move(free)), parameters_(std::move(start)) {}

    [[nodiscard]] int values() const { return static_cast<int>(problem_.observed.size()); }

    int operator()(const Eigen::VectorXd& x, Eigen::VectorXd& residuals) {
        const bool allowed = place(x);
        if (allowed) residuals = residuals_at(problem_, parameters_);
        if (!allowed || !residuals.allFinite())
            residuals = Eigen::VectorXd::Constant(index(problem_.observed.size()), kForbidden);
        return 0;
    }
    int df(const Eigen::VectorXd& x, Eigen::MatrixXd& slopes) {
        place(x);
        slopes = slopes_at(problem_, parameters_, free_);
        return slopes.allFinite() ? 0 : -1;
    }

    [[nodiscard]] Eigen::VectorXd free_values() const {
        Eigen::VectorXd x(index(free_.size()));
        for (std::size_t a = 0; a < free_.size(); ++a)
            x(index(a)) = parameters_[free_[a]];
        return x;
    }
    /// Sets the free parameters; false where one leaves its range.
    bool place(const Eigen::VectorXd& x) {
        bool allowed = true;
        for (std::size_t a = 0; a < free_.size(); ++a) {
            const ParameterRange range = problem_.ranges[free_[a]];
            const double value = x(index(a));
            allowed = allowed && value >= range.low && value <= range.high;
            parameters_[free_[a]] = value;
        }
        return allowed;
    }
    [[nodiscard]] const std::vector<double>& parameters() const { return parameters_; }

private:
    const LeastSquaresProblem& problem_;
    std::vector<std::size_t> free_;
    std::vector<double> parameters_;
};

}  // namespace

std::optional<LocalMinimum> minimum_from(const LeastSquaresProblem& problem,
                                         std::span<const Standing> standing,
                                         std::vector<double> start) {
    std::vector<std::size_t> free = free_parameters(standing);
    const bool any_free = !free.empty();
    Descent descent(problem, std::move(free), std::move(start));
    if (!residuals_at(problem, descent.parameters()).allFinite()) return std::nullopt;
    if (any_free) {
        Eigen::VectorXd x = descent.free_values();
        Eigen::LevenbergMarquardt<Descent> method(descent);
        method.parameters.factor = 1.0;
        method.parameters.ftol = std::numeric_limits<double>::epsilon();
        method.parameters.xtol = std::numeric_limits<double>::epsilon();
        method.parameters.maxfev = kMostEvaluations;
        method.minimize(x);
        descent.place(x);
    }
    const double sum = residuals_at(problem, descent.parameters()).squaredNorm();
    return LocalMinimum{descent.parameters(), sum};
}

ScaledSlopes scaled_slopes(const LeastSquaresProblem& problem, std::span<const double> parameters,
                           std::span<const std::size_t> free) {
    ScaledSlopes found;
    if (free.empty()) return found;
    Eigen::MatrixXd slopes = slopes_at(problem, parameters, free);
    const Eigen::VectorXd residuals = residuals_at(problem, parameters);
    const double residual_length = residuals.norm();
    Eigen::VectorXd per_length(slopes.cols());
    for (Eigen::Index a = 0; a < slopes.cols(); ++a) {
        const double length = slopes.col(a).norm();
        if (!(length > 0.0 && std::isfinite(length))) return {kDependent, 0.0, {}};
        per_length(a) = 1.0 / length;
        slopes.col(a) /= length;
        if (residual_length > 0.0)
            found.gradient_cosine = std::max(
                found.gradient_cosine, std::abs(slopes.col(a).dot(residuals)) / residual_length);
    }
    const Eigen::JacobiSVD<Eigen::MatrixXd> svd(slopes, Eigen::ComputeThinU | Eigen::ComputeThinV);
    const Eigen::VectorXd& singular = svd.singularValues();  // the largest first
    const double smallest = singular(singular.size() - 1);
    found.condition = smallest > 0.0 ? singular(0) / smallest : kDependent;
    if (found.condition == kDependent) return found;
    const Eigen::MatrixXd root =
        per_length.asDiagonal() * svd.matrixV() * singular.cwiseInverse().asDiagonal();
    const Eigen::MatrixXd inverse = root * root.transpose();
    for (Eigen::Index a = 0; a < inverse.rows(); ++a)
        for (Eigen::Index b = 0; b < inverse.cols(); ++b)
            found.inverse_square.push_back(inverse(a, b));
    return found;
}

}  // namespace rainledger
