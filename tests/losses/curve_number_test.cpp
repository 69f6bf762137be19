#include "rainledger/losses/curve_number.hpp"

#include <cmath>

#include "test.hpp"

namespace rainledger {

TEST_CASE("retention of a curve number and back") {
    CHECK(retention_mm(100.0) == 0.0);
    CHECK_THAT(retention_mm(80.0), WithinRel(63.5, 1e-14));
    for (const double number : {100.0, 98.0, 89.0, 61.0, 30.0, 1.0})
        CHECK_THAT(curve_number_of(retention_mm(number)), WithinRel(number, 1e-14));
}

TEST_CASE("increments of runoff add up to the runoff of the sum") {
    const RetentionCurve curve{63.5, 12.7};
    double P = 0.0;
    RunoffIncrement sum;
    for (int i = 0; i < 1000; ++i) {
        const double dP = 0.05 + 0.0002 * i;
        const RunoffIncrement part = runoff_increment(curve, P, dP);
        CHECK_THAT(part.initial_abstraction_mm + part.infiltrated_mm + part.excess_mm,
                   WithinAbs(dP, 1e-15));
        sum.initial_abstraction_mm += part.initial_abstraction_mm;
        sum.infiltrated_mm += part.infiltrated_mm;
        sum.excess_mm += part.excess_mm;
        P += dP;
    }
    CHECK_THAT(sum.excess_mm, WithinRel(cumulative_runoff_mm(curve, P), 1e-12));
    CHECK_THAT(sum.initial_abstraction_mm, WithinRel(12.7, 1e-12));
    const double x = P - 12.7;
    CHECK_THAT(sum.infiltrated_mm, WithinRel(63.5 * x / (x + 63.5), 1e-12));
}

TEST_CASE("the limits of the retention curve") {
    CHECK(cumulative_runoff_mm({63.5, 12.7}, 12.7) == 0.0);
    CHECK(cumulative_runoff_mm({0.0, 0.0}, 40.0) == 40.0);
    CHECK(runoff_increment({0.0, 0.0}, 0.0, 3.0).excess_mm == 3.0);
    CHECK(runoff_start_time({63.5, 12.7}, 25.4) == 0.5);
    CHECK(std::isinf(runoff_start_time({63.5, 12.7}, 0.0)));
}

TEST_CASE("the 0.05 conversion applies only where it is asked for") {
    const CurveNumber plain{80.0, 0.05, {}, AntecedentCondition::II};
    CHECK_THAT(retention_curve(plain, 80.0).retention_mm, WithinRel(63.5, 1e-14));
    CHECK_THAT(retention_curve(plain, 80.0).initial_abstraction_mm, WithinRel(3.175, 1e-14));
    const CurveNumber converted{80.0, 0.05, 0.2, AntecedentCondition::II};
    // S005 = 1.33 * 2.5^1.15 in
    const double retention = 1.33 * std::pow(2.5, 1.15) * 25.4;
    CHECK_THAT(retention_curve(converted, 80.0).retention_mm, WithinRel(retention, 1e-14));
    CHECK_THAT(retention_curve(converted, 80.0).initial_abstraction_mm,
               WithinRel(0.05 * retention, 1e-14));
}

}  // namespace rainledger
