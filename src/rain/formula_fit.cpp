#include "rainledger/rain/formula_fit.hpp"

#include <array>
#include <cmath>
#include <cstddef>
#include <string>
#include <string_view>
#include <utility>

#include <Eigen/Core>
#include <unsupported/Eigen/NonLinearOptimization>

// Least squares on log intensity, ln i = ln a - n ln(t^m + b), t in minutes. ln a is linear and is
// projected out (Golub and Pereyra 1973, SIAM J. Numer. Anal. 10(2), 413-432): at given b and
// exponent it is the mean of ln i + n ln(t^m + b). What is left are two unknowns, taken as
// s = ln(t0^m + b), t0 the shortest duration, and the logarithm of the free exponent: then every
// pair of real numbers is a formula that is positive over the list.
namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;
constexpr std::size_t kFewest = 4;

/// A point is stationary where the residuals stand at right angles to both columns of the Jacobian,
/// to this cosine, or are nothing but rounding.
constexpr double kStationaryCosine = 1e-6;
constexpr double kRoundingResidual = 1e-13;

/// Past this many times t^m at the longest duration, b has run away: the formula no longer bends
/// over the list, and its constants are not determined.
constexpr double kLargestB = 1e6;

constexpr std::string_view kNotNear = "no formula of this form comes near these depths";

/// The centred residuals ln i + n ln(t^m + b) - ln a as a function of the two unknowns, in the form
/// that Eigen's Levenberg-Marquardt asks for.
class ProjectedResiduals {
public:
    using Scalar = double;
    using InputType = Eigen::VectorXd;
    using ValueType = Eigen::VectorXd;
    using JacobianType = Eigen::MatrixXd;
    enum { InputsAtCompileTime = Eigen::Dynamic, ValuesAtCompileTime = Eigen::Dynamic };

    ProjectedResiduals(const DepthList& list, FormulaForm form)
        : form_(form), log_t_(list.duration_h.size()), log_intensity_(log_t_.size()) {
        for (Eigen::Index i = 0; i < log_t_.size(); ++i) {
            const double hours = list.duration_h[static_cast<std::size_t>(i)];
            log_t_[i] = std::log(hours * kMinutesPerHour);
            log_intensity_[i] = std::log(list.depth_mm[static_cast<std::size_t>(i)] / hours);
        }
    }

    [[nodiscard]] int inputs() const { return 2; }
    [[nodiscard]] int values() const { return static_cast<int>(log_t_.size()); }

    int operator()(const Eigen::VectorXd& x, Eigen::VectorXd& residuals) const {
        residuals = with_intensity(x);
        residuals.array() -= residuals.mean();
        return 0;
    }
    int df(const Eigen::VectorXd& x, Eigen::MatrixXd& jacobian) const;

    /// The formula at two unknowns; ln a is the projected one.
    [[nodiscard]] IntensityFormula formula(const Eigen::VectorXd& x) const {
        return {std::exp(with_intensity(x).mean()), std::exp(x[0]) - first_power(x), m_of(x),
                n_of(x), 1.0 / kMinutesPerHour};
    }
    /// s of a formula whose b is `b_share` times t0^m.
    [[nodiscard]] Eigen::VectorXd start(double b_share, double exponent) const {
        const double m = form_ == FormulaForm::free_m ? exponent : 1.0;
        return Eigen::Vector2d(m * log_t_[0] + std::log1p(b_share), std::log(exponent));
    }

private:
    [[nodiscard]] double m_of(const Eigen::VectorXd& x) const {
        return form_ == FormulaForm::free_m ? std::exp(x[1]) : 1.0;
    }
    [[nodiscard]] double n_of(const Eigen::VectorXd& x) const {
        return form_ == FormulaForm::free_n ? std::exp(x[1]) : 1.0;
    }
    [[nodiscard]] double first_power(const Eigen::VectorXd& x) const {
        return std::exp(m_of(x) * log_t_[0]);
    }
    /// t^m + b, as e^s + (t^m - t0^m).
    [[nodiscard]] Eigen::ArrayXd insides(const Eigen::VectorXd& x) const {
        return std::exp(x[0]) + (m_of(x) * log_t_.array()).exp() - first_power(x);
    }
    /// ln i + n ln(t^m + b).
    [[nodiscard]] Eigen::VectorXd with_intensity(const Eigen::VectorXd& x) const {
        return log_intensity_.array() + n_of(x) * insides(x).log();
    }

    FormulaForm form_;
    Eigen::VectorXd log_t_;
    Eigen::VectorXd log_intensity_;
};

int ProjectedResiduals::df(const Eigen::VectorXd& x, Eigen::MatrixXd& jacobian) const {
    const Eigen::ArrayXd inside = insides(x);
    const double m = m_of(x);
    const double n = n_of(x);
    jacobian.col(0) = n * std::exp(x[0]) / inside;
    if (form_ == FormulaForm::free_m)
        jacobian.col(1) =
            m * ((m * log_t_.array()).exp() * log_t_.array() - first_power(x) * log_t_[0]) / inside;
    else
        jacobian.col(1) = n * inside.log();
    jacobian.rowwise() -= jacobian.colwise().mean().eval();
    return 0;
}

struct Minimum {
    Eigen::VectorXd x;
    double rms = 0.0;
    bool is_stationary = false;
};

/// Descends from one start. Levenberg-Marquardt stops by itself where steps no longer change the
/// sum of squares beyond rounding, at the latest after `maxfev` evaluations.
Minimum descend(const ProjectedResiduals& residuals, Eigen::VectorXd x) {
    ProjectedResiduals functor = residuals;
    Eigen::LevenbergMarquardt<ProjectedResiduals> search(functor);
    search.parameters.ftol = 0.0;
    search.parameters.xtol = 1e-15;
    search.parameters.maxfev = 1000;
    search.minimize(x);

    Eigen::VectorXd r(residuals.values());
    Eigen::MatrixXd jacobian(residuals.values(), residuals.inputs());
    residuals(x, r);
    residuals.df(x, jacobian);
    const double rms = r.norm() / std::sqrt(static_cast<double>(r.size()));
    const Eigen::VectorXd gradient = jacobian.transpose() * r;
    const Eigen::VectorXd full = r.norm() * jacobian.colwise().norm().transpose();
    const bool at_right_angles = (gradient.array().abs() <= kStationaryCosine * full.array()).all();
    return {std::move(x), rms, at_right_angles || rms <= kRoundingResidual};
}

/// The least of the stationary points reached from a grid of starts.
std::optional<Minimum> best_minimum(const ProjectedResiduals& residuals) {
    constexpr std::array kShareStarts{-0.5, 0.0, 1.0, 4.0, 16.0};
    constexpr std::array kExponentStarts{0.4, 0.6, 0.8, 1.0, 1.3};
    std::optional<Minimum> best;
    for (const double share : kShareStarts) {
        for (const double exponent : kExponentStarts) {
            Minimum found = descend(residuals, residuals.start(share, exponent));
            if (found.is_stationary && (!best || found.rms < best->rms)) best = std::move(found);
        }
    }
    return best;
}

std::string problem_of(const DepthList& list) {
    const auto& t = list.duration_h;
    if (t.size() < kFewest || list.depth_mm.size() != t.size())
        return "a formula has three constants, so its fit needs at least four depths, not " +
               std::to_string(t.size());
    for (std::size_t i = 0; i < t.size(); ++i) {
        const bool rises = i == 0 || t[i] > t[i - 1];
        if (!rises || !(t[i] > 0.0) || !(list.depth_mm[i] > 0.0) || !std::isfinite(t[i]) ||
            !std::isfinite(list.depth_mm[i]))
            return "a fit needs durations that rise and depths above zero";
    }
    return {};
}

std::string problem_of(const IntensityFormula& formula, const DepthList& list) {
    const double longest = std::pow(list.duration_h.back() * kMinutesPerHour, formula.m);
    if (!std::isfinite(formula.a_mm_per_h) || !(formula.a_mm_per_h > 0.0) ||
        !(formula.b < kLargestB * longest))
        return std::string(kNotNear);
    const double from = depth_rises_from_h(formula);
    const double until = depth_rises_until_h(formula);
    if (list.duration_h.front() < from)
        return "the depth of the nearest formula falls with duration up to " + duration_label(from);
    if (list.duration_h.back() > until)
        return "the depth of the nearest formula falls with duration beyond " +
               duration_label(until);
    return {};
}

}  // namespace

FitAnswer fit_formula(const DepthList& list, FormulaForm form) {
    if (std::string problem = problem_of(list); !problem.empty())
        return {std::nullopt, std::move(problem)};
    const ProjectedResiduals residuals(list, form);
    const auto minimum = best_minimum(residuals);
    if (!minimum) return {std::nullopt, std::string(kNotNear)};
    FormulaFit fit{form, residuals.formula(minimum->x), {}, minimum->rms};
    if (std::string problem = problem_of(fit.formula, list); !problem.empty())
        return {std::nullopt, std::move(problem)};
    for (std::size_t i = 0; i < list.duration_h.size(); ++i) {
        const double tabulated = list.depth_mm[i] / list.duration_h[i];
        fit.residual.push_back(intensity_mm_per_h(fit.formula, list.duration_h[i]) / tabulated -
                               1.0);
    }
    return {std::move(fit), {}};
}

}  // namespace rainledger
