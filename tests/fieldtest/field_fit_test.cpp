#include "rainledger/fieldtest/field_fit.hpp"

#include <algorithm>
#include <limits>

#include "fieldtest/tests_of.hpp"
#include "rainledger/losses/horton.hpp"

namespace rainledger {
namespace {

const std::vector<double> kMinutes{5, 10, 15, 20, 30, 40, 50, 60, 80, 100, 120, 140};

InfiltrationTest pit_of(const HortonCurve& curve, const std::string& name,
                        const std::vector<double>& minutes = kMinutes) {
    std::vector<double> depths;
    for (const double minute : minutes)
        depths.push_back(horton_cumulative(curve, minute / 60.0));
    return test_of(ReadingKind::infiltrated, minutes, depths, name);
}

FieldFit fit_of(const std::vector<InfiltrationTest>& tests, const FieldFitOptions& options = {}) {
    const FieldFitAnswer answer = fit_field_tests(tests, options);
    REQUIRE(answer.problems.empty());
    REQUIRE(answer.fit);
    return *answer.fit;
}

std::string text_of(const std::vector<FitWarning>& warnings, FitCaution caution) {
    const auto found = std::ranges::find(warnings, caution, &FitWarning::caution);
    return found == warnings.end() ? "" : found->text;
}

}  // namespace

TEST_CASE("one good test gives ranked laws, lines and a steady rate") {
    const FieldFit fit = fit_of({pit_of({120.0, 25.0, 4.0}, "")});
    REQUIRE(fit.pits.size() == 1);
    CHECK_FALSE(fit.pooled);
    const TestFit& pit = fit.pits.front();
    CHECK(pit.laws.size() == kFieldLaws.size());
    CHECK(pit.ranking.front().law == FieldLaw::horton);
    CHECK(pit.tail_rate().steady);
    CHECK(pit.warnings.empty());
    REQUIRE(pit.final_without_end);
    CHECK(pit.final_without_end->left_out == 3);
    CHECK_THAT(pit.final_without_end->without_mm_per_h, WithinRel(25.0, 1.0e-6));
}

TEST_CASE("the straight line stands beside the fit with its bias") {
    const FieldFit fit = fit_of({pit_of({120.0, 25.0, 4.0}, "")});
    const TestFit& pit = fit.pits.front();
    REQUIRE(pit.lines.size() == 2);
    CHECK(pit.lines[0].place == RatePlace::interval_end);
    CHECK(pit.lines[1].place == RatePlace::interval_middle);
    for (const LineFit& line : pit.lines) {
        REQUIRE(line.answer.line);
        REQUIRE(line.bias);
        const HortonCurve& curve = line.answer.line->curve;
        CHECK(curve.final_capacity_mm_per_h == pit.tail_rate().mean_mm_per_h);
        CHECK_THAT(line.bias->decay_per_h, WithinAbs(curve.decay_per_h - 4.0, 1.0e-6));
        CHECK_THAT(line.bias->initial_capacity_mm_per_h,
                   WithinAbs(curve.initial_capacity_mm_per_h - 120.0, 1.0e-5));
        CHECK_THAT(line.bias->rmse_mm, WithinAbs(*line.rmse_mm, 1.0e-6));
        CHECK(line.bias->rmse_mm > 0.0);
    }
    // The ends put the rates late, and so the beginning too high.
    CHECK(pit.lines[0].bias->initial_capacity_mm_per_h >
          pit.lines[1].bias->initial_capacity_mm_per_h);
}

TEST_CASE("where fc comes from can be chosen") {
    const std::vector<InfiltrationTest> tests{pit_of({120.0, 25.0, 4.0}, "")};
    FieldFitOptions options;
    options.laws = {FieldLaw::horton};
    options.steady_use = SteadyUse::fixed;
    options.fixed_rate_mm_per_h = 22.0;
    const TestFit fixed = fit_of(tests, options).pits.front();
    CHECK(fixed.laws[0].fit->parameters[1].value == 22.0);
    CHECK(fixed.laws[0].fit->parameters[1].kind == EstimateKind::held);
    CHECK(fixed.lines[0].answer.line->curve.final_capacity_mm_per_h == 22.0);
    CHECK_FALSE(fixed.final_without_end);
    options.steady_use = SteadyUse::tail;
    const TestFit tail = fit_of(tests, options).pits.front();
    CHECK(tail.laws[0].fit->parameters[1].value == tail.tail_rate().mean_mm_per_h);
    const FieldFit two = fit_of({tests.front(), pit_of({90.0, 15.0, 3.0}, "P2")}, options);
    CHECK_THAT(two.pooled->laws[0].fit->parameters[1].value,
               WithinRel(0.5 * (two.pits[0].tail_rate().mean_mm_per_h +
                                two.pits[1].tail_rate().mean_mm_per_h),
                         1.0e-12));
}

TEST_CASE("a test that stopped too early says so, and what hangs on it") {
    // k = 1.2/h read for 40 min: half of the fall is still to come.
    const std::vector<double> drops{7.9, 6.1, 6.4, 5.2, 5.6, 4.7, 4.9, 4.0};
    const FieldFit fit =
        fit_of({test_of(ReadingKind::drop, {5, 10, 15, 20, 25, 30, 35, 40}, drops)});
    const TestFit& pit = fit.pits.front();
    CHECK(text_of(pit.warnings, FitCaution::stopped_early) ==
          "the test stopped too early: its last three rates still differ by 20 % of their mean, "
          "54.4 mm/h, so that a final rate is an extrapolation");
    REQUIRE(pit.final_without_end);
    CHECK(pit.final_without_end->left_out == 2);
    CHECK(text_of(pit.warnings, FitCaution::noisy).empty());
    CHECK_THAT(text_of(pit.warnings, FitCaution::final_depends_on_end),
               Contains("without the last 2"));
    const TestFit two = fit_of({test_of(ReadingKind::drop, {5, 10}, {4.0, 3.0})}).pits.front();
    CHECK(text_of(two.warnings, FitCaution::stopped_early) ==
          "the test has fewer than three readings: nothing tells whether it is steady");
    CHECK(text_of(two.warnings, FitCaution::no_fit) ==
          "Horton could not be fitted: it takes at least 3 readings, and there are 2");
}

TEST_CASE("a noisy test is told apart") {
    const FieldFit fit =
        fit_of({test_of(ReadingKind::drop, {10, 20, 30, 40, 50, 60, 70, 80, 90, 100},
                        {9.0, 2.0, 7.0, 1.0, 6.0, 0.5, 5.0, 2.0, 6.0, 1.0})});
    CHECK_THAT(text_of(fit.pits.front().warnings, FitCaution::noisy),
               Contains("the readings are noisy: intervals scatter by"));
}

TEST_CASE("pits are fitted apart and together, with their spread") {
    const FieldFit fit = fit_of({pit_of({120.0, 25.0, 4.0}, "P1"), pit_of({90.0, 15.0, 3.0}, "P2"),
                                 pit_of({150.0, 35.0, 5.0}, "P3")});
    REQUIRE(fit.pooled);
    CHECK(fit.pooled->laws.size() == kFieldLaws.size());
    const LawFit& pooled = *fit.pooled->laws[0].fit;
    CHECK(pooled.readings.size() == 3 * kMinutes.size());
    CHECK(pooled.readings.back().test == 2);
    CHECK(pooled.degrees_of_freedom == 33);
    const PitSpread& spread = fit.pooled->spread[1];
    CHECK(spread.key == "final_capacity_mm_per_h");
    CHECK_THAT(spread.mean, WithinRel(25.0, 1.0e-6));
    CHECK_THAT(*spread.deviation, WithinRel(10.0, 1.0e-6));
    CHECK_THAT(spread.smallest, WithinRel(15.0, 1.0e-6));
    CHECK_THAT(spread.largest, WithinRel(35.0, 1.0e-6));
    CHECK_THAT(*spread.values[2], WithinRel(35.0, 1.0e-6));
    CHECK(pooled.parameters[1].value > 15.0);
    CHECK(pooled.parameters[1].value < 35.0);
    CHECK_THAT(text_of(fit.pooled->warnings, FitCaution::pits_differ),
               Contains("the spread between pits is the uncertainty of the site") &&
                   Contains("says (coefficient)") && !Contains("_mm"));
}

TEST_CASE("equal pits pool to what each gives") {
    const FieldFit fit =
        fit_of({pit_of({120.0, 25.0, 4.0}, "P1"), pit_of({120.0, 25.0, 4.0}, "P2")});
    CHECK_THAT(fit.pooled->laws[0].fit->parameters[2].value, WithinRel(4.0, 1.0e-7));
    CHECK(*fit.pooled->spread[2].deviation < 1.0e-6);
}

TEST_CASE("first readings and design factor reach every fit") {
    FieldFitOptions options;
    options.ignore_first_h = 0.25;
    options.design_factor = 2.0;
    const FieldFit fit =
        fit_of({pit_of({120.0, 25.0, 4.0}, "P1"), pit_of({120.0, 25.0, 4.0}, "P2")}, options);
    CHECK(fit.pits[0].ignored_readings == 3);
    // Before a quarter of an hour 21.3 mm infiltrate; the line's depths do not hold them either.
    CHECK(*fit.pits[0].lines[1].rmse_mm < 1.0);
    CHECK_THAT(fit.pits[0].laws[0].fit->parameters[1].design_value, WithinRel(12.5, 1.0e-6));
    CHECK_THAT(fit.pooled->laws[0].fit->parameters[1].design_value, WithinRel(12.5, 1.0e-6));
}

TEST_CASE("options and tests that do not do are refused, all at once") {
    const std::vector<InfiltrationTest> tests{pit_of({120.0, 25.0, 4.0}, "P1")};
    FieldFitOptions options;
    options.laws = {FieldLaw::horton, FieldLaw::horton};
    options.steady_use = SteadyUse::fixed;
    options.fixed_rate_mm_per_h = -1.0;
    options.ignore_first_h = std::numeric_limits<double>::quiet_NaN();
    options.design_factor = 0.5;
    CHECK(fit_field_tests(tests, options).problems ==
          std::vector<std::string>{"Horton is asked for twice",
                                   "the fixed steady rate is negative or not finite",
                                   "the time to ignore is negative or not finite",
                                   "the design factor is below 1 or not finite: it divides the "
                                   "rates"});
    options = {};
    options.laws.clear();
    CHECK(fit_field_tests({}, options).problems ==
          std::vector<std::string>{"no law is asked for", "there is no test"});
    options = {};
    options.ignore_first_h = 5.0;
    CHECK(fit_field_tests(tests, options).problems ==
          std::vector<std::string>{"pit P1: no reading is left after the time to ignore"});
}

}  // namespace rainledger
