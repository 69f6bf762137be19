#include "rainledger/fieldtest/steady_rate.hpp"

#include "fieldtest/tests_of.hpp"

namespace rainledger {
namespace {

/// A test of equal intervals with the given rates.
InfiltrationTest of_rates(double interval_min, const std::vector<double>& rates) {
    std::vector<double> minutes;
    std::vector<double> drops;
    for (std::size_t i = 0; i < rates.size(); ++i) {
        minutes.push_back(interval_min * static_cast<double>(i + 1));
        drops.push_back(rates[i] * interval_min / 60.0);
    }
    return test_of(ReadingKind::drop, minutes, drops);
}

constexpr auto kThree = SteadyConvention::last_three_within_tenth;
constexpr auto kHourly = SteadyConvention::less_than_tenth_in_an_hour;

}  // namespace

TEST_CASE("the last three rates within a tenth make a steady rate") {
    const SteadyRate rate = steady_rate(of_rates(15, {120, 80, 60, 51, 49, 50}), kThree);
    CHECK(rate.steady);
    CHECK(rate.first_reading == 3);
    CHECK(rate.readings == 3);
    CHECK_THAT(rate.mean_mm_per_h, WithinRel(50.0, 1.0e-12));
    CHECK_THAT(*rate.relative_change, WithinRel(0.04, 1.0e-9));
    // By hand: deviation 1, error 1/sqrt(3), Student's t of 2 degrees of freedom 4.303.
    CHECK_THAT(*rate.standard_error_mm_per_h, WithinRel(0.57735, 1.0e-5));
    CHECK_THAT(*rate.low_mm_per_h, WithinRel(50.0 - 4.3027 * 0.57735, 1.0e-5));
    CHECK_THAT(*rate.high_mm_per_h, WithinRel(50.0 + 4.3027 * 0.57735, 1.0e-5));
}

TEST_CASE("the steady stretch is the longest end that keeps the convention") {
    const SteadyRate rate = steady_rate(of_rates(15, {120, 80, 52, 51, 49, 50}), kThree);
    CHECK(rate.first_reading == 2);
    CHECK(rate.readings == 4);
    CHECK_THAT(rate.mean_mm_per_h, WithinRel(50.5, 1.0e-12));
}

TEST_CASE("rates that still fall are not steady, and their mean stands for want of better") {
    const SteadyRate rate = steady_rate(of_rates(15, {120, 80, 60, 50, 45}), kThree);
    CHECK_FALSE(rate.steady);
    CHECK_FALSE(rate.undecided);
    CHECK(rate.first_reading == 2);
    CHECK_THAT(rate.mean_mm_per_h, WithinRel(155.0 / 3.0, 1.0e-12));
    CHECK_THAT(*rate.relative_change, WithinRel(15.0 / (155.0 / 3.0), 1.0e-9));
}

TEST_CASE("exactly a tenth is not within a tenth") {
    CHECK_FALSE(steady_rate(of_rates(60, {84, 80, 76}), kThree).steady);
    CHECK(steady_rate(of_rates(60, {83.9, 80, 76.1}), kThree).steady);
}

TEST_CASE("the rate must change by less than a tenth within an hour") {
    // Over the last hour, 50 to 46: 8 %; the hour from 56 on, 12.5 %.
    const InfiltrationTest slow = of_rates(30, {90, 70, 56, 52, 50, 48, 46});
    const SteadyRate rate = steady_rate(slow, kHourly);
    CHECK(rate.steady);
    CHECK(rate.first_reading == 3);
    CHECK_THAT(*rate.relative_change, WithinRel(0.08, 1.0e-9));
    CHECK_THAT(rate.mean_mm_per_h, WithinRel(49.0, 1.0e-12));
    // A short test of which the last three agree cannot say what an hour brings.
    const InfiltrationTest brief = of_rates(5, {90, 60, 50, 49, 50});
    CHECK(steady_rate(brief, kThree).steady);
    CHECK(steady_rate(brief, kHourly).undecided);
    CHECK_FALSE(steady_rate(brief, kHourly).relative_change);
    // Ten minutes apart, three rates may agree while the hour does not.
    const InfiltrationTest creeping = of_rates(10, {100, 90, 82, 75, 69, 64, 60, 58, 56, 55});
    CHECK(steady_rate(creeping, kThree).steady);
    CHECK_FALSE(steady_rate(creeping, kHourly).steady);
}

TEST_CASE("between readings far apart an hour takes its share of the change") {
    const SteadyRate slow = steady_rate(of_rates(240, {90, 60, 45, 36}), kHourly);
    // 45 to 36 in 4 h: 20 %, 5 % in an hour; 60 to 45: 6.25 %; 90 to 60: 8.3 %.
    CHECK(slow.steady);
    CHECK(slow.first_reading == 0);
    CHECK_THAT(*slow.relative_change, WithinRel(0.0625, 1.0e-9));
    CHECK_FALSE(steady_rate(of_rates(120, {90, 60, 45, 30}), kHourly).steady);
}

TEST_CASE("few readings decide nothing, and a dry end is steady") {
    const SteadyRate two = steady_rate(of_rates(30, {60, 58}), kThree);
    CHECK(two.undecided);
    CHECK_FALSE(two.steady);
    CHECK(two.readings == 2);
    const SteadyRate one = steady_rate(of_rates(30, {60}), kHourly);
    CHECK(one.mean_mm_per_h == 60.0);
    CHECK_FALSE(one.standard_error_mm_per_h);
    const SteadyRate dry = steady_rate(of_rates(30, {60, 0, 0, 0}), kThree);
    CHECK(dry.steady);
    CHECK(dry.first_reading == 1);
    CHECK(dry.mean_mm_per_h == 0.0);
    CHECK_FALSE(steady_rate(of_rates(30, {60, 0, 0, 5, 5}), kHourly).steady);
}

}  // namespace rainledger
