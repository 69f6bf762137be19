#include "rainledger/fieldtest/steady_rate.hpp"

#include <algorithm>
#include <cmath>
#include <vector>

#include "fieldtest/student.hpp"

namespace rainledger {
namespace {

constexpr double kTenth = 0.1;
constexpr std::size_t kFewest = 3;  // readings of a steady stretch
constexpr double kHour = 1.0;
/// Room for times that are decimal fractions of an hour.
constexpr double kSameTime = 1.0e-9;

using Readings = std::span<const TestReading>;

double mean_rate(Readings readings) {
    double sum = 0.0;
    for (const TestReading& reading : readings)
        sum += reading.rate_mm_per_h;
    return sum / static_cast<double>(readings.size());
}

/// Largest less smallest rate over the mean; 0 where all are 0.
double relative_span(Readings readings) {
    const auto [low, high] = std::ranges::minmax(readings, {}, &TestReading::rate_mm_per_h);
    const double span = high.rate_mm_per_h - low.rate_mm_per_h;
    return span > 0.0 ? span / mean_rate(readings) : 0.0;
}

/// Change of the rate between two readings over the former; infinite from 0.
double relative_change(const TestReading& from, const TestReading& to) {
    const double change = std::abs(to.rate_mm_per_h - from.rate_mm_per_h);
    return change > 0.0 ? change / from.rate_mm_per_h : 0.0;
}

/// Largest change of the rate from one reading to a later one within an hour; between neighbours
/// further apart, the change that falls to one hour.
double hourly_change(Readings readings) {
    double most = 0.0;
    for (std::size_t i = 0; i < readings.size(); ++i)
        for (std::size_t j = i + 1; j < readings.size(); ++j) {
            const double hours = readings[j].middle_h - readings[i].middle_h;
            const bool far = hours > kHour + kSameTime;
            if (far && j > i + 1) break;
            const double change = relative_change(readings[i], readings[j]);
            most = std::max(most, far ? change * kHour / hours : change);
        }
    return most;
}

/// Hours between the middles of the first and the last interval.
double middles_apart(Readings readings) {
    return readings.back().middle_h - readings.front().middle_h;
}

bool covers_an_hour(Readings readings) {
    return middles_apart(readings) >= kHour - kSameTime;
}

/// The readings of the last hour: from the last one whose middle lies at least an hour before the
/// end.
Readings last_hour(Readings readings) {
    std::size_t first = readings.size() - 1;
    while (first > 0 && !covers_an_hour(readings.subspan(first)))
        --first;
    return readings.subspan(first);
}

/// A convention: whether it can judge the readings, what it judges at the end of the test, and
/// what over a longer stretch.
struct Rule {
    bool (*decides)(Readings);
    Readings (*end)(Readings);
    double (*change)(Readings);
};

Rule rule_of(SteadyConvention convention) {
    if (convention == SteadyConvention::last_three_within_tenth)
        return {[](Readings all) { return all.size() >= kFewest; },
                [](Readings all) { return all.last(kFewest); }, relative_span};
    return {[](Readings all) { return all.size() >= kFewest && covers_an_hour(all); },
            [](Readings all) {
                const Readings end = last_hour(all);
                return end.size() < kFewest ? all.last(kFewest) : end;
            },
            hourly_change};
}

void add_mean(SteadyRate& rate, Readings all, std::size_t count) {
    const Readings used = all.last(count);
    rate.first_reading = all.size() - count;
    rate.readings = count;
    rate.mean_mm_per_h = mean_rate(used);
    if (count < 2) return;
    double squares = 0.0;
    for (const TestReading& reading : used)
        squares += std::pow(reading.rate_mm_per_h - rate.mean_mm_per_h, 2);
    const double n = static_cast<double>(count);
    const double error = std::sqrt(squares / (n - 1.0) / n);
    const double half = student_95(count - 1) * error;
    rate.standard_error_mm_per_h = error;
    rate.low_mm_per_h = rate.mean_mm_per_h - half;
    rate.high_mm_per_h = rate.mean_mm_per_h + half;
}

}  // namespace

std::string_view steady_convention_words(SteadyConvention convention) {
    return convention == SteadyConvention::last_three_within_tenth
               ? "last three rates within 10 %"
               : "less than 10 % change in an hour";
}

SteadyRate steady_rate(const InfiltrationTest& test, SteadyConvention convention) {
    SteadyRate rate;
    rate.convention = convention;
    const Readings all = test.readings;
    const Rule rule = rule_of(convention);
    rate.undecided = !rule.decides(all);
    std::size_t count = std::min(kFewest, all.size());
    if (!rate.undecided) {
        const Readings end = rule.end(all);
        rate.relative_change = rule.change(end);
        rate.steady = *rate.relative_change < kTenth;
        if (rate.steady) count = end.size();
        while (rate.steady && count < all.size() && rule.change(all.last(count + 1)) < kTenth)
            ++count;
    }
    add_mean(rate, all, count);
    return rate;
}

double kostiakov_steady_time_h(double exponent) {
    constexpr double kHourOverTenth = 10.0;
    return kHourOverTenth * (1.0 - exponent);
}

}  // namespace rainledger
