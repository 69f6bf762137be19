#include "rainledger/fieldtest/law_fits.hpp"

#include <algorithm>
#include <cmath>

#include "fieldtest/fits_of.hpp"
#include "fieldtest/scipy_fits.hpp"
#include "rainledger/losses/green_ampt.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/losses/philip.hpp"

namespace rainledger {
TEST_CASE("the fits are SciPy's") {
    for (const SciPyFit& theirs : scipy_fits()) {
        INFO(field_law_key(theirs.law)
             << (theirs.intervals ? " on intervals " : " ") << theirs.depths_mm[0]);
        const auto kind = theirs.intervals ? ReadingKind::drop : ReadingKind::infiltrated;
        const LawFit ours = fit_of(test_of(kind, kSciPyMinutes, theirs.depths_mm), theirs.law);
        CHECK(ours.converged);
        CHECK(ours.on_intervals == theirs.intervals);
        CHECK_THAT(ours.residual_sum_mm2, WithinRel(theirs.residual_sum, 1.0e-9));
        REQUIRE(ours.parameters.size() == theirs.parameters.size());
        for (std::size_t i = 0; i < ours.parameters.size(); ++i) {
            INFO(ours.parameters[i].key);
            CHECK_THAT(ours.parameters[i].value, WithinRel(theirs.parameters[i], 1.0e-6));
            REQUIRE(ours.parameters[i].standard_error);
            CHECK_THAT(*ours.parameters[i].standard_error, WithinRel(theirs.errors[i], 1.0e-5));
        }
    }
}

TEST_CASE("an exact test gives its law back") {
    const LawFit horton = fit_of(horton_test({120.0, 25.0, 3.0}), FieldLaw::horton);
    CHECK_THAT(horton.parameters[0].value, WithinRel(120.0, 1.0e-8));
    CHECK_THAT(horton.parameters[1].value, WithinRel(25.0, 1.0e-8));
    CHECK_THAT(horton.parameters[2].value, WithinRel(3.0, 1.0e-8));
    CHECK(horton.rmse_mm < 1.0e-9);
    CHECK(horton.r_squared > 0.999999999);
    CHECK_FALSE(horton.lag_one_correlation);
    CHECK(horton.warnings.empty());

    const LawFit green_ampt =
        fit_of(exact_test([](double t) { return green_ampt_cumulative(10.9, 40.0, t); }),
               FieldLaw::green_ampt);
    CHECK_THAT(green_ampt.parameters[0].value, WithinRel(10.9, 1.0e-8));
    CHECK_THAT(green_ampt.parameters[1].value, WithinRel(40.0, 1.0e-8));

    const LawFit philip = fit_of(
        exact_test([](double t) { return philip_cumulative(30.0, 8.0, t); }), FieldLaw::philip);
    CHECK_THAT(philip.parameters[0].value, WithinRel(30.0, 1.0e-9));
    CHECK_THAT(philip.parameters[1].value, WithinRel(8.0, 1.0e-9));

    const LawFit kostiakov =
        fit_of(exact_test([](double t) { return 42.0 * std::pow(t, 0.55); }), FieldLaw::kostiakov);
    CHECK_THAT(kostiakov.parameters[0].value, WithinRel(42.0, 1.0e-9));
    CHECK_THAT(kostiakov.parameters[1].value, WithinRel(0.55, 1.0e-9));

    const LawFit modified =
        fit_of(exact_test([](double t) { return 22.0 * std::pow(t, 0.45) + 9.0 * t; }),
               FieldLaw::modified_kostiakov);
    CHECK_THAT(modified.parameters[0].value, WithinRel(22.0, 1.0e-7));
    CHECK_THAT(modified.parameters[1].value, WithinRel(0.45, 1.0e-7));
    CHECK_THAT(modified.parameters[2].value, WithinRel(9.0, 1.0e-7));
}

TEST_CASE("a held final capacity is not fitted, and has no interval") {
    const LawFit fit = fit_of(horton_test({120.0, 25.0, 3.0}), FieldLaw::horton,
                              {.final_capacity_mm_per_h = 20.0});
    CHECK(fit.parameters[1].value == 20.0);
    CHECK(fit.parameters[1].kind == EstimateKind::held);
    CHECK_FALSE(fit.parameters[1].low);
    CHECK(fit.parameters[0].kind == EstimateKind::fitted);
    CHECK(fit.parameters[0].low);
    CHECK(fit.degrees_of_freedom == 10);
    CHECK(fit.rmse_mm > 0.1);
}

TEST_CASE("quality figures are those of hand calculation") {
    // A constant capacity's depths, +0.1 and -0.1 about 10 t: Philip with Sp on 0 or small.
    const InfiltrationTest test =
        test_of(ReadingKind::infiltrated, {60, 120, 180, 240}, {10.1, 19.9, 30.1, 39.9});
    const LawFit fit = fit_of(test, FieldLaw::kostiakov);
    double squares = 0.0;
    for (const FittedReading& reading : fit.readings)
        squares += reading.residual_mm * reading.residual_mm;
    CHECK_THAT(fit.rmse_mm, WithinRel(std::sqrt(squares / 4.0), 1.0e-12));
    CHECK_THAT(fit.r_squared, WithinRel(1.0 - squares / 496.04, 1.0e-12));
    CHECK_FALSE(fit.aicc);  // n = q + 1
    CHECK_THAT(fit.residual_sum_mm2, WithinRel(squares, 1.0e-12));
    CHECK_THAT(*fit.residual_deviation_mm, WithinRel(std::sqrt(squares / 2.0), 1.0e-12));

    const LawFit five = fit_of(
        test_of(ReadingKind::infiltrated, {60, 120, 180, 240, 300}, {10.1, 19.9, 30.1, 39.9, 50.1}),
        FieldLaw::kostiakov);
    // q = 3: 2 q + 2 q (q + 1)/(n - q - 1) = 6 + 24.
    REQUIRE(five.aicc);
    CHECK_THAT(*five.aicc, WithinRel(5.0 * std::log(five.residual_sum_mm2 / 5.0) + 30.0, 1.0e-12));
}

TEST_CASE("readings, curve and design values are ready to be shown") {
    const InfiltrationTest test = horton_test({120.0, 25.0, 3.0});
    const LawFit fit = fit_of(test, FieldLaw::horton, {.design_factor = 2.0});
    CHECK_THAT(fit.parameters[0].design_value, WithinRel(60.0, 1.0e-8));
    CHECK_THAT(fit.parameters[1].design_value, WithinRel(12.5, 1.0e-8));
    CHECK_THAT(fit.parameters[2].design_value, WithinRel(3.0, 1.0e-8));
    REQUIRE(fit.readings.size() == kMinutes.size());
    CHECK(fit.readings[3].end_h == 0.25);
    CHECK_THAT(fit.readings[3].fitted_depth_mm, WithinRel(test.readings[3].depth_mm, 1.0e-8));
    CHECK_THAT(fit.readings[3].fitted_rate_mm_per_h,
               WithinRel(test.readings[3].rate_mm_per_h, 1.0e-8));
    CHECK(fit.curve.front().depth_mm == 0.0);
    CHECK_THAT(fit.curve.front().rate_mm_per_h, WithinRel(120.0, 1.0e-8));
    CHECK(fit.curve.back().time_h == 2.5);
    CHECK_THAT(fit.curve.back().depth_mm, WithinRel(test.readings.back().depth_mm, 1.0e-8));
    const LawFit philip = fit_of(test, FieldLaw::philip);
    CHECK(std::isinf(philip.curve.front().rate_mm_per_h));
    CHECK(std::isfinite(philip.curve[1].rate_mm_per_h));
}

TEST_CASE("halving the rates of Green-Ampt halves its depth") {
    const LawFit fit =
        fit_of(exact_test([](double t) { return green_ampt_cumulative(10.0, 40.0, t); }),
               FieldLaw::green_ampt, {.design_factor = 2.0});
    CHECK_THAT(
        green_ampt_cumulative(fit.parameters[0].design_value, fit.parameters[1].design_value, 1.5),
        WithinRel(0.5 * green_ampt_cumulative(10.0, 40.0, 1.5), 1.0e-8));
}

TEST_CASE("the covariance is of what is reported") {
    const SciPyFit horton = scipy_fits().front();
    const LawFit fit = fit_of(test_of(ReadingKind::infiltrated, kSciPyMinutes, horton.depths_mm),
                              FieldLaw::horton);
    REQUIRE(fit.covariance.size() == 9);
    for (std::size_t i = 0; i < 3; ++i)
        for (std::size_t j = 0; j < 3; ++j) {
            CHECK(fit.covariance[3 * i + j] == fit.covariance[3 * j + i]);
            const double bound =
                *fit.parameters[i].standard_error * *fit.parameters[j].standard_error;
            CHECK(std::abs(fit.covariance[3 * i + j]) <= bound * (1.0 + 1.0e-12));
        }
    CHECK(fit.covariance[2] > 0.0);  // a faster decay goes with a higher start
    // Student's t of 9 degrees of freedom, from any table: 2.262.
    CHECK_THAT(
        (*fit.parameters[0].high - fit.parameters[0].value) / *fit.parameters[0].standard_error,
        WithinAbs(2.262, 0.0005));
}

TEST_CASE("first readings left out keep the test's times") {
    const InfiltrationTest whole = horton_test({120.0, 25.0, 3.0});
    const InfiltrationTest rest = without_first(whole, 10.0 / 60.0);
    CHECK_THAT(rest.from_h, WithinRel(10.0 / 60.0, 1.0e-12));
    const LawFit fit = fit_of(rest, FieldLaw::horton);
    CHECK_THAT(fit.parameters[0].value, WithinRel(120.0, 1.0e-6));
    CHECK_THAT(fit.parameters[2].value, WithinRel(3.0, 1.0e-6));
    CHECK(fit.curve.front().time_h == rest.from_h);
}

TEST_CASE("laws are ranked by their criterion") {
    const InfiltrationTest test =
        test_of(ReadingKind::infiltrated, kSciPyMinutes, scipy_fits().front().depths_mm);
    std::vector<LawFitAnswer> answers;
    for (const FieldLaw law : kFieldLaws)
        answers.push_back(fit_law({&test, 1}, law));
    const auto ranking = rank_laws(answers);
    REQUIRE(ranking.size() == answers.size());
    CHECK(ranking.front().law == FieldLaw::horton);
    CHECK(*ranking.front().aicc_above_best == 0.0);
    for (std::size_t i = 1; i < ranking.size(); ++i)
        CHECK(*ranking[i].aicc_above_best >= *ranking[i - 1].aicc_above_best);
    answers.push_back({FieldLaw::philip, {}, "no readings"});
    CHECK(rank_laws(answers).size() == kFieldLaws.size());
}

TEST_CASE("what cannot be fitted says why") {
    const InfiltrationTest two = horton_test({120.0, 25.0, 3.0}, {10, 30});
    CHECK(fit_law({&two, 1}, FieldLaw::horton).problem ==
          "it takes at least 3 readings, and there are 2");
    CHECK(fit_law({&two, 1}, FieldLaw::horton, {.final_capacity_mm_per_h = 25.0}).fit);
    CHECK(fit_law({&two, 1}, FieldLaw::philip).fit);
    const InfiltrationTest dry = test_of(ReadingKind::drop, {5, 10, 15, 20}, {0, 0, 0, 0});
    CHECK(fit_law({&dry, 1}, FieldLaw::horton).problem == "nothing has infiltrated");
}

}  // namespace rainledger
