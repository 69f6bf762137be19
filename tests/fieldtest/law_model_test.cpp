#include "fieldtest/law_model.hpp"

#include <cmath>

#include "test.hpp"

namespace rainledger {
namespace {

/// Derivative of the depth by one parameter: central differences of two steps, extrapolated
/// (Richardson), so that their error is of the fourth order of a thousandth.
double difference_slope(FieldLaw law, const std::vector<double>& own, std::size_t j, double t) {
    const auto central = [&](double step) {
        std::vector<double> up = own;
        std::vector<double> down = own;
        up[j] += step;
        down[j] -= step;
        return (law_depth(law, up, t) - law_depth(law, down, t)) / (2.0 * step);
    };
    const double step = 1.0e-3 * own[j];
    return (4.0 * central(step / 2.0) - central(step)) / 3.0;
}

void check_slopes(FieldLaw law, const std::vector<double>& own) {
    for (const double t : {1.0e-3, 0.01, 0.03, 0.1, 0.5, 2.0, 6.0, 24.0}) {
        const LawSlopes slopes = law_slopes(law, own, t);
        for (std::size_t j = 0; j < own.size(); ++j) {
            INFO(field_law_key(law) << ", parameter " << j << " of " << own[j] << " at " << t);
            const double expected = difference_slope(law, own, j, t);
            // Differences of depths lose digits: 1e-16 of the depth over a thousandth of the
            // parameter.
            const double lost = 1.0e-12 * law_depth(law, own, t) / own[j];
            CHECK((WithinRel(expected, 1.0e-8).match(slopes[j]) ||
                   WithinAbs(expected, lost).match(slopes[j])));
        }
    }
}

}  // namespace

TEST_CASE("slopes are those of the depths") {
    check_slopes(FieldLaw::horton, {95.0, 25.0, 3.0});
    check_slopes(FieldLaw::horton, {30.0, 5.0, 0.01});
    check_slopes(FieldLaw::horton, {2000.0, 5.0, 80.0});
    // B = 2 K S: from a suction that rules to none to speak of.
    check_slopes(FieldLaw::green_ampt, {10.0, 800.0});
    check_slopes(FieldLaw::green_ampt, {0.01, 800.0});
    check_slopes(FieldLaw::green_ampt, {1.0e-4, 50.0});
    check_slopes(FieldLaw::green_ampt, {50.0, 10.0});
    check_slopes(FieldLaw::philip, {30.0, 8.0});
    check_slopes(FieldLaw::kostiakov, {40.0, 0.6});
    check_slopes(FieldLaw::modified_kostiakov, {25.0, 0.5, 12.0});
}

TEST_CASE("slopes reach the bounds without a jump") {
    for (const double t : {0.1, 2.0}) {
        const LawSlopes dry = law_slopes(FieldLaw::green_ampt, std::vector{0.0, 800.0}, t);
        const LawSlopes nearly = law_slopes(FieldLaw::green_ampt, std::vector{1.0e-5, 800.0}, t);
        CHECK_THAT(nearly[0], WithinRel(dry[0], 1.0e-5));
        CHECK_THAT(nearly[1], WithinRel(dry[1], 1.0e-5));
        const LawSlopes still = law_slopes(FieldLaw::horton, std::vector{90.0, 20.0, 0.0}, t);
        const LawSlopes slow = law_slopes(FieldLaw::horton, std::vector{90.0, 20.0, 1.0e-6}, t);
        for (std::size_t j = 0; j < 3; ++j)
            CHECK_THAT(slow[j], WithinRel(still[j], 1.0e-5));
    }
}

TEST_CASE("rates are the slopes of the depths in time") {
    const std::vector<std::pair<FieldLaw, std::vector<double>>> laws{
        {FieldLaw::horton, {95.0, 25.0, 3.0}},
        {FieldLaw::green_ampt, {10.0, 800.0}},
        {FieldLaw::green_ampt, {0.0, 800.0}},
        {FieldLaw::green_ampt, {10.0, 0.0}},
        {FieldLaw::philip, {30.0, 8.0}},
        {FieldLaw::kostiakov, {40.0, 0.6}},
        {FieldLaw::modified_kostiakov, {25.0, 0.0, 12.0}}};
    for (const auto& [law, own] : laws)
        for (const double t : {0.05, 1.0, 7.0}) {
            const double step = 1.0e-4 * t;
            INFO(field_law_key(law) << " at " << t);
            CHECK_THAT(law_rate(law, own, t),
                       WithinRel(law_growth(law, own, t - step, t + step) / (2.0 * step), 1.0e-7));
        }
}

}  // namespace rainledger
