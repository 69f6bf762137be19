#pragma once

#include <array>
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/fieldtest/fit_warning.hpp"
#include "rainledger/fieldtest/readings.hpp"

// Infiltration laws fitted to a test, the soil ponded from time 0, by nonlinear least squares over
// closed bounds.
//
//   Horton               F = fc t + (f0 - fc)/k (1 - exp(-k t))       f0 >= fc >= 0, k >= 0
//   Green and Ampt       F - S ln(1 + F/S) = K t                      K >= 0, S >= 0
//   Philip               F = Sp sqrt(t) + A t                         Sp >= 0, A >= 0
//   Kostiakov            F = a t^b                                    a >= 0, b >= 0
//   modified Kostiakov   F = a t^b + c t                              a >= 0, 0 <= b <= 1, c >= 0
//
// Horton 1933, Green and Ampt 1911 and Philip 1957 as in the losses room; Kostiakov 1932, "On the
// dynamics of the coefficient of water percolation in soils"; the modified form also Lewis's or
// Mezencev's (from memory). t in hours, so that a is the depth at 1 h.
//
// Cumulative depths are fitted where each has an error of its own, interval depths where errors add
// up (errors_add_up). A test whose first readings were left out counts its depths from where they
// end, and keeps its times.
namespace rainledger {

enum class FieldLaw { horton, green_ampt, philip, kostiakov, modified_kostiakov };
inline constexpr std::array kFieldLaws{FieldLaw::horton, FieldLaw::green_ampt, FieldLaw::philip,
                                       FieldLaw::kostiakov, FieldLaw::modified_kostiakov};

/// "horton", "green_ampt", "philip", "kostiakov", "modified_kostiakov".
[[nodiscard]] std::string_view field_law_key(FieldLaw law);
/// "Horton", "Green-Ampt", ...
[[nodiscard]] std::string_view field_law_name(FieldLaw law);

/// How a parameter came by its value.
enum class EstimateKind {
    fitted,     ///< inside its bounds
    on_bound,   ///< the best fit lies on a bound: no interval
    held,       ///< given, not fitted: no interval
    unlimited,  ///< infinite: Green-Ampt's suction-deficit product where its conductivity is 0
};

/// One parameter, in mm and h. Standard error and 95 % interval are by the delta method: linear in
/// the fit's own parameters, with Student's t; nothing where there are none.
struct ParameterEstimate {
    std::string_view key;  ///< with its unit: "initial_capacity_mm_per_h"
    double value = 0.0;
    EstimateKind kind = EstimateKind::fitted;
    std::optional<double> standard_error = {};
    std::optional<double> low = {};
    std::optional<double> high = {};
    double design_value = 0.0;  ///< of the law whose rates are all divided by the design factor
};

/// A reading beside its fit. Depths count from the test's from_h.
struct FittedReading {
    std::size_t test = 0;  ///< index among the tests fitted together
    std::size_t row = 0;   ///< of TestReading
    double end_h = 0.0;
    double depth_mm = 0.0;
    double fitted_depth_mm = 0.0;
    double residual_mm = 0.0;  ///< read less fitted
    double rate_mm_per_h = 0.0;
    double fitted_rate_mm_per_h = 0.0;  ///< mean over the interval
};

/// A point of a fitted curve. The rate is infinite at time 0 where it is unlimited there.
struct CurvePoint {
    double time_h = 0.0;
    double depth_mm = 0.0;  ///< from the earliest from_h
    double rate_mm_per_h = 0.0;
};

struct LawFit {
    FieldLaw law = FieldLaw::horton;
    std::vector<ParameterEstimate> parameters;  ///< in the order of the formulas above
    /// Of the parameters, row by row; zero for those without error; empty where none is known.
    std::vector<double> covariance;
    std::vector<FittedReading> readings;
    std::vector<CurvePoint> curve;
    double rmse_mm = 0.0;    ///< root mean square of the residuals on cumulative depth
    double r_squared = 0.0;  ///< on cumulative depth
    /// Akaike's criterion for few data (Hurvich and Tsai 1989, from memory) on what was fitted,
    /// with every parameter that is not held counted and one for the variance; nothing with too few
    /// readings.
    std::optional<double> aicc = {};
    bool on_intervals = false;      ///< interval depths were fitted
    double residual_sum_mm2 = 0.0;  ///< of squares, of what was fitted
    std::size_t degrees_of_freedom = 0;
    std::optional<double> residual_deviation_mm = {};  ///< of what was fitted
    std::optional<double> lag_one_correlation = {};    ///< of its residuals, within each test
    double condition = 1.0;                            ///< see LeastSquaresFit
    bool converged = false;
    std::vector<FitWarning> warnings;
};

struct LawFitOptions {
    std::optional<double> final_capacity_mm_per_h = {};  ///< Horton's fc, held; >= 0
    double design_factor = 1.0;                          ///< > 0; divides rates
};

/// A fit, or why there is none.
struct LawFitAnswer {
    FieldLaw law = FieldLaw::horton;
    std::optional<LawFit> fit;
    std::string problem;
};

/// Fits one law to one test, or to several together (the same parameters for all). A law needs at
/// least as many readings as it has parameters to fit, and something must have infiltrated.
[[nodiscard]] LawFitAnswer fit_law(std::span<const InfiltrationTest> tests, FieldLaw law,
                                   const LawFitOptions& options = {});

/// A law by its rank; the first is the best.
struct RankedLaw {
    FieldLaw law = FieldLaw::horton;
    std::size_t index = 0;                       ///< among the answers
    std::optional<double> aicc_above_best = {};  ///< nothing where there is no criterion
};

/// The fits in order of their criterion; those without it last, by their error on depth. Equal ones
/// keep their order.
[[nodiscard]] std::vector<RankedLaw> rank_laws(std::span<const LawFitAnswer> answers);

}  // namespace rainledger
