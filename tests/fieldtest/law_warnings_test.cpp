#include <algorithm>
#include <cmath>
#include <string>

#include "fieldtest/fits_of.hpp"

namespace rainledger {
namespace {

bool warns(const LawFit& fit, FitCaution caution) {
    return std::ranges::find(fit.warnings, caution, &FitWarning::caution) != fit.warnings.end();
}

std::string text_of(const LawFit& fit, FitCaution caution) {
    const auto found = std::ranges::find(fit.warnings, caution, &FitWarning::caution);
    return found == fit.warnings.end() ? "" : found->text;
}

}  // namespace

TEST_CASE("a steady term that wants to be negative ends on 0, marked, without interval") {
    // The rate of F = 30 t^0.4 falls faster than that of the square root.
    const InfiltrationTest test = exact_test([](double t) { return 30.0 * std::pow(t, 0.4); });
    const LawFit philip = fit_of(test, FieldLaw::philip);
    CHECK(philip.parameters[1].value == 0.0);
    CHECK(philip.parameters[1].kind == EstimateKind::on_bound);
    CHECK_FALSE(philip.parameters[1].low);
    CHECK(philip.parameters[0].low);
    CHECK(text_of(philip, FitCaution::negative_steady_term) ==
          "Philip: the steady term ended on its bound, 0; the free fit would be negative, so these "
          "readings do not tell a steady rate");

    const LawFit green_ampt = fit_of(test, FieldLaw::green_ampt);
    CHECK(green_ampt.parameters[0].value == 0.0);
    CHECK(green_ampt.parameters[0].kind == EstimateKind::on_bound);
    CHECK(std::isinf(green_ampt.parameters[1].value));
    CHECK(green_ampt.parameters[1].kind == EstimateKind::unlimited);
    CHECK(warns(green_ampt, FitCaution::negative_steady_term));
    CHECK_THAT(green_ampt.rmse_mm, WithinRel(philip.rmse_mm, 1.0e-9));

    const LawFit horton =
        fit_of(exact_test([](double t) { return 40.0 * -std::expm1(-1.5 * t); }), FieldLaw::horton);
    CHECK(horton.parameters[1].value == 0.0);
    CHECK(horton.parameters[1].kind == EstimateKind::on_bound);
    CHECK_THAT(horton.parameters[2].value, WithinRel(1.5, 1.0e-7));
}

TEST_CASE("rates that do not fall leave Horton a constant capacity") {
    const LawFit fit =
        fit_of(exact_test([](double t) { return 12.0 * t + 2.0 * t * t; }), FieldLaw::horton);
    CHECK(fit.parameters[0].value == fit.parameters[1].value);
    CHECK(fit.parameters[0].kind == EstimateKind::on_bound);
    CHECK(fit.parameters[2].kind == EstimateKind::on_bound);
    CHECK(text_of(fit, FitCaution::on_bound) ==
          "Horton: the initial capacity ended on the final one: the rates do not fall");
    CHECK(std::ranges::count(fit.warnings, FitCaution::on_bound, &FitWarning::caution) == 1);
    const LawFit power =
        fit_of(exact_test([](double t) { return 12.0 * std::pow(t, 1.2); }), FieldLaw::kostiakov);
    CHECK(warns(power, FitCaution::rising_rate));
}

TEST_CASE("the exponent of the modified form stays that of a falling rate") {
    const LawFit fit = fit_of(exact_test([](double t) { return 12.0 * t + 2.0 * t * t; }),
                              FieldLaw::modified_kostiakov);
    CHECK(fit.parameters[0].value == 0.0);
    CHECK(fit.parameters[1].value <= 1.0);
    CHECK(fit.parameters[2].kind == EstimateKind::fitted);
}

TEST_CASE("a test that says little is told apart") {
    // Rates that scatter about a constant one but for a high first reading.
    const LawFit flat = fit_of(test_of(ReadingKind::drop, {2, 4, 6, 8, 10, 12, 14, 16, 18, 20},
                                       {2.1, 1.9, 2.0, 1.8, 2.1, 1.9, 1.8, 2.0, 1.9, 1.8}),
                               FieldLaw::horton);
    CHECK(text_of(flat, FitCaution::on_bound) ==
          "Horton: the decay ended on its bound of 600 1/h: the rate has fallen before the first "
          "reading, and the initial capacity tells no more than a depth taken in at once");
    CHECK(text_of(flat, FitCaution::not_identified) ==
          "Horton: the interval of the initial capacity spans more than a factor of ten: the "
          "readings hardly tell it");
    const LawFit philip = fit_of(test_of(ReadingKind::drop, {2, 4, 6, 8, 10, 12, 14, 16, 18, 20},
                                         {2.1, 1.9, 2.0, 1.8, 2.1, 1.9, 1.8, 2.0, 1.9, 1.8}),
                                 FieldLaw::philip);
    CHECK(text_of(philip, FitCaution::not_identified) ==
          "Philip: the interval of the sorptivity spans zero: the readings do not tell it");

    const LawFit early =
        fit_of(horton_test({60.0, 10.0, 1.0}, {5, 10, 15, 20, 30, 40}), FieldLaw::horton);
    CHECK(text_of(early, FitCaution::shorter_than_decay) ==
          "Horton: the test is shorter than 1/k, 60 min: the final capacity is an extrapolation");

    const LawFit three = fit_of(horton_test({120.0, 25.0, 3.0}, {10, 30, 90}), FieldLaw::horton);
    CHECK(three.degrees_of_freedom == 0);
    CHECK_FALSE(three.parameters[0].low);
    CHECK_FALSE(three.aicc);
    CHECK(warns(three, FitCaution::no_freedom));
    CHECK_THAT(three.parameters[2].value, WithinRel(3.0, 1.0e-6));

    const LawFit four =
        fit_of(horton_test({120.0, 25.0, 3.0}, {10, 30, 90, 120}), FieldLaw::horton);
    CHECK(text_of(four, FitCaution::few_readings) ==
          "Horton: 4 readings for 3 parameters are few: take the intervals with care");
}

TEST_CASE("smooth misfits show as correlated residuals") {
    const LawFit fit = fit_of(horton_test({200.0, 20.0, 4.0}, {5, 10, 15, 20, 25, 30, 35, 40, 50,
                                                               60, 70, 80, 90, 100, 110, 120}),
                              FieldLaw::philip);
    REQUIRE(fit.lag_one_correlation);
    CHECK(*fit.lag_one_correlation > 0.5);
    CHECK_THAT(text_of(fit, FitCaution::correlated_residuals),
               Contains("the intervals are too narrow"));
}

TEST_CASE("a final capacity above the last rates is noticed") {
    const LawFit fit = fit_of(test_of(ReadingKind::drop, {5, 10, 15, 20, 25, 30, 35, 40, 45, 50},
                                      {9.0, 5.5, 4.1, 3.9, 4.0, 4.1, 4.0, 3.2, 3.1, 3.0}),
                              FieldLaw::horton);
    CHECK_THAT(text_of(fit, FitCaution::final_above_last_rates),
               Contains("lies above the last rates read"));
}

}  // namespace rainledger
