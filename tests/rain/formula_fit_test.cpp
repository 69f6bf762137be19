#include "rainledger/rain/formula_fit.hpp"

#include <cmath>
#include <cstddef>
#include <limits>
#include <string>
#include <vector>

#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kMinute = 1.0 / 60.0;

DepthList list_of(const std::vector<double>& minutes, std::vector<double> depths_mm) {
    DepthList list{{}, std::move(depths_mm)};
    for (const double t : minutes)
        list.duration_h.push_back(t / 60.0);
    return list;
}

/// The list that a formula gives at these minutes.
DepthList list_by(const IntensityFormula& formula, const std::vector<double>& minutes) {
    std::vector<double> depths;
    for (const double t : minutes)
        depths.push_back(intensity_mm_per_h(formula, t / 60.0) * t / 60.0);
    return list_of(minutes, depths);
}

/// Sum of squares of the log residuals of a formula whose a is the best for its other constants.
double least_sum_of_squares(const DepthList& list, const IntensityFormula& formula) {
    double sum = 0.0;
    double sum_of_squares = 0.0;
    const auto n = static_cast<double>(list.duration_h.size());
    for (std::size_t i = 0; i < list.duration_h.size(); ++i) {
        const double r = std::log(list.depth_mm[i] / list.duration_h[i] /
                                  intensity_mm_per_h(formula, list.duration_h[i]));
        sum += r;
        sum_of_squares += r * r;
    }
    return sum_of_squares - sum * sum / n;
}

const std::vector<double> kCountyMinutes{5, 10, 15, 30, 60, 120, 180, 360, 720, 1440};
const std::vector<double> kCountyDepths{12.5, 19, 23.5, 32.5, 41, 48, 52, 62, 74, 88};

struct City {
    const char* name;
    double c;
    double e;
    double f;
};

/// 10-year constants of i = c / (t^e + f), in/h and min: Chow, Maidment and Mays, Applied
/// Hydrology, 1988, table 14.2.3, after Wenzel 1982 (from memory).
constexpr City kCities[] = {
    {"Atlanta", 97.5, 0.83, 6.88},   {"Chicago", 94.9, 0.88, 9.04},
    {"Cleveland", 73.7, 0.86, 8.25}, {"Denver", 96.6, 0.97, 13.90},
    {"Houston", 97.4, 0.77, 4.80},   {"Los Angeles", 20.3, 0.63, 2.06},
    {"Miami", 124.2, 0.81, 6.19},    {"New York", 78.1, 0.82, 6.57},
    {"Santa Fe", 62.5, 0.89, 9.10},  {"St. Louis", 104.7, 0.89, 9.44},
};

/// What tests/reference/formula_fit.py prints: scipy.optimize.least_squares, eight digits.
struct Reference {
    const char* name;
    FormulaForm form;
    std::vector<double> minutes;
    std::vector<double> depths_mm;
    double a;
    double b;
    double exponent;
    double rms;
};

std::vector<Reference> scipy_fits() {
    const std::vector<double> short_minutes{5, 10, 15, 20, 30, 45, 60, 90, 120};
    const std::vector<double> short_depths{10.9, 16.2, 21.1, 23.4, 29.3, 33.1, 37.9, 41.0, 44.8};
    const std::vector<double> negative_minutes{10, 15, 20, 30, 60, 120, 240, 1440};
    const std::vector<double> negative_depths{21.0, 22.8, 24.9, 27.9, 34.5, 43.1, 54.0, 98.0};
    using enum FormulaForm;
    return {
        {"county", free_m, kCountyMinutes, kCountyDepths, 1276.217, 4.7372226, 0.80708779,
         0.023060048},
        {"county", free_n, kCountyMinutes, kCountyDepths, 1091.6999, 7.5108401, 0.78561017,
         0.018603866},
        {"scattered, short", free_m, short_minutes, short_depths, 1317.3231, 6.4632288, 0.82534507,
         0.020325594},
        {"scattered, short", free_n, short_minutes, short_depths, 949.26801, 8.4790396, 0.76981579,
         0.021928806},
        {"negative b", free_m, negative_minutes, negative_depths, 486.49233, -0.65879033,
         0.65774521, 0.0048442078},
        {"negative b", free_n, negative_minutes, negative_depths, 516.70868, -1.630988, 0.66569084,
         0.0034522726},
    };
}

}  // namespace

TEST_CASE("a fit finds the published constants of ten cities again from the depths they give") {
    for (const City& city : kCities) {
        CAPTURE(city.name);
        const DepthList list = list_by({city.c * 25.4, city.f, city.e, 1.0, kMinute},
                                       {5, 10, 15, 20, 30, 45, 60, 90, 120});
        const FitAnswer answer = fit_formula(list, FormulaForm::free_m);
        REQUIRE(answer.fit.has_value());
        CHECK(answer.problem.empty());
        const IntensityFormula& formula = answer.fit->formula;
        CHECK_THAT(formula.a_mm_per_h, WithinRel(city.c * 25.4, 1e-9));
        CHECK_THAT(formula.m, WithinRel(city.e, 1e-10));
        CHECK_THAT(formula.b, WithinRel(city.f, 1e-9));
        CHECK(formula.n == 1.0);
        CHECK(formula.time_unit_h == kMinute);
        CHECK(answer.fit->rms_log_residual < 1e-13);
    }
}

TEST_CASE("a fit finds constants of the other form again, with b above, at and below zero") {
    for (const double b : {25.0, 8.0, 0.0, -2.0}) {
        CAPTURE(b);
        const FitAnswer answer = fit_formula(
            list_by({900.0, b, 1.0, 0.72, kMinute}, {10, 15, 20, 30, 60, 120, 360, 1440}),
            FormulaForm::free_n);
        REQUIRE(answer.fit.has_value());
        CHECK_THAT(answer.fit->formula.a_mm_per_h, WithinRel(900.0, 1e-9));
        CHECK_THAT(answer.fit->formula.b, WithinAbs(b, 1e-8));
        CHECK_THAT(answer.fit->formula.n, WithinRel(0.72, 1e-10));
        CHECK(answer.fit->formula.m == 1.0);
    }
}

TEST_CASE("fits to invented tables with scatter agree with SciPy") {
    constexpr double kEightDigits = 1e-7;  // printed digits of the reference
    for (const Reference& reference : scipy_fits()) {
        CAPTURE(reference.name, reference.form == FormulaForm::free_m ? "m free" : "n free");
        const FitAnswer answer =
            fit_formula(list_of(reference.minutes, reference.depths_mm), reference.form);
        REQUIRE(answer.fit.has_value());
        const IntensityFormula& formula = answer.fit->formula;
        const bool free_m = reference.form == FormulaForm::free_m;
        CHECK_THAT(formula.a_mm_per_h, WithinRel(reference.a, kEightDigits));
        CHECK_THAT(formula.b, WithinRel(reference.b, kEightDigits));
        CHECK_THAT(free_m ? formula.m : formula.n, WithinRel(reference.exponent, kEightDigits));
        CHECK((free_m ? formula.n : formula.m) == 1.0);
        CHECK_THAT(answer.fit->rms_log_residual, WithinRel(reference.rms, kEightDigits));
    }
}

TEST_CASE("no formula near a fitted one comes nearer to the table") {
    const DepthList list = list_of(kCountyMinutes, kCountyDepths);
    for (const FormulaForm form : {FormulaForm::free_m, FormulaForm::free_n}) {
        const FitAnswer answer = fit_formula(list, form);
        REQUIRE(answer.fit.has_value());
        const double least = least_sum_of_squares(list, answer.fit->formula);
        CHECK_THAT(std::sqrt(least / 10.0), WithinRel(answer.fit->rms_log_residual, 1e-9));
        for (const double step : {1e-3, -1e-3, 1e-2, -1e-2, 0.1, -0.1}) {
            for (const double other : {0.0, step, -step}) {
                IntensityFormula near = answer.fit->formula;
                near.b *= 1.0 + step;
                (form == FormulaForm::free_m ? near.m : near.n) *= 1.0 + other;
                CHECK(least_sum_of_squares(list, near) > least);
            }
        }
    }
}

TEST_CASE("residuals are fitted over tabulated intensity, less one") {
    const DepthList list = list_of(kCountyMinutes, kCountyDepths);
    const FitAnswer answer = fit_formula(list, FormulaForm::free_n);
    REQUIRE(answer.fit.has_value());
    REQUIRE(answer.fit->residual.size() == kCountyMinutes.size());
    double sum_of_logs = 0.0;
    for (std::size_t i = 0; i < kCountyMinutes.size(); ++i) {
        const double fitted_mm =
            intensity_mm_per_h(answer.fit->formula, list.duration_h[i]) * list.duration_h[i];
        CHECK_THAT(answer.fit->residual[i], WithinAbs(fitted_mm / kCountyDepths[i] - 1.0, 1e-14));
        sum_of_logs += std::log1p(answer.fit->residual[i]);
    }
    CHECK_THAT(sum_of_logs, WithinAbs(0.0, 1e-12));
}

TEST_CASE("a fit does not depend on the unit of depth or on repetition") {
    DepthList in_tenths = list_of(kCountyMinutes, kCountyDepths);
    const FitAnswer first = fit_formula(in_tenths, FormulaForm::free_m);
    CHECK(fit_formula(in_tenths, FormulaForm::free_m).fit->formula.a_mm_per_h ==
          first.fit->formula.a_mm_per_h);
    for (double& depth : in_tenths.depth_mm)
        depth *= 10.0;
    const FitAnswer scaled = fit_formula(in_tenths, FormulaForm::free_m);
    CHECK_THAT(scaled.fit->formula.a_mm_per_h,
               WithinRel(10.0 * first.fit->formula.a_mm_per_h, 1e-9));
    CHECK_THAT(scaled.fit->formula.b, WithinRel(first.fit->formula.b, 1e-9));
}

TEST_CASE("a formula whose depth would fall within the table is no fit") {
    // Depths that level off after 30 minutes: the nearest formula bends down.
    const FitAnswer beyond = fit_formula(
        list_of({5, 10, 15, 30, 60, 120, 240}, {10, 16, 20, 25, 26, 26, 26}), FormulaForm::free_m);
    CHECK_FALSE(beyond.fit.has_value());
    CHECK(beyond.problem == "the depth of the nearest formula falls with duration beyond 1.378 h");
    // Depths that hardly rise at first.
    const FitAnswer before =
        fit_formula(list_of({5, 10, 15, 30, 60, 120, 240}, {20, 20, 20.5, 24, 30, 38, 49}),
                    FormulaForm::free_n);
    CHECK_FALSE(before.fit.has_value());
    CHECK(before.problem ==
          "the depth of the nearest formula falls with duration up to 7.53781 min");
}

TEST_CASE("depths that no formula can bend to are refused") {
    // Intensity rising with duration: every b is nearer than the one before it.
    for (const FormulaForm form : {FormulaForm::free_m, FormulaForm::free_n}) {
        const FitAnswer answer =
            fit_formula(list_of({5, 10, 15, 30, 60}, {10, 30, 70, 200, 900}), form);
        CHECK_FALSE(answer.fit.has_value());
        CHECK(answer.problem == "no formula of this form comes near these depths");
    }
}

TEST_CASE("what cannot be fitted is refused") {
    CHECK(fit_formula(list_of({5, 10, 15}, {1, 2, 3}), FormulaForm::free_m).problem ==
          "a formula has three constants, so its fit needs at least four depths, not 3");
    constexpr double kNan = std::numeric_limits<double>::quiet_NaN();
    for (const DepthList& list :
         {list_of({5, 10, 10, 15}, {1, 2, 3, 4}), list_of({0, 5, 10, 15}, {1, 2, 3, 4}),
          list_of({5, 10, 15, 20}, {0, 2, 3, 4}), list_of({5, 10, 15, 20}, {1, 2, kNan, 4}),
          list_of({5, 10, 15, kNan}, {1, 2, 3, 4})}) {
        const FitAnswer answer = fit_formula(list, FormulaForm::free_n);
        CHECK_FALSE(answer.fit.has_value());
        CHECK(answer.problem == "a fit needs durations that rise and depths above zero");
    }
}

}  // namespace rainledger
