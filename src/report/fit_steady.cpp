#include <algorithm>
#include <cstddef>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/fit_summary_parts.hpp"
#include "report/lookup_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;
constexpr double kPercent = 100.0;

std::string minutes_words(double hours) {
    return four_figures(hours * kMinutesPerHour) + " min";
}

std::string rate_words(double mm_per_h, const Display& display) {
    return display.rate(mm_per_h) + " " + std::string(display.rate_unit());
}

std::string mean_words(const SteadyRate& rate, const Display& display) {
    std::string out =
        fmt::format("{}, mean of {} reading{}", rate_words(rate.mean_mm_per_h, display),
                    rate.readings, rate.readings == 1 ? "" : "s");
    if (rate.low_mm_per_h)
        out += fmt::format(" (95 % interval {} to {})", display.rate(*rate.low_mm_per_h),
                           display.rate(*rate.high_mm_per_h));
    return out;
}

std::string change_words(const SteadyRate& rate) {
    const std::string percent = fixed(kPercent * rate.relative_change.value_or(0.0), 0);
    if (rate.convention == SteadyConvention::last_three_within_tenth)
        return "they differ by " + percent + " % of their mean";
    return "the rate still changed by " + percent + " % within the last hour";
}

std::string convention_words(const TestFit& pit, const SteadyRate& rate, const Display& display) {
    if (rate.undecided)
        return rate.convention == SteadyConvention::last_three_within_tenth
                   ? "cannot be told, with too few readings"
                   : "cannot be told, the test is too short for it";
    if (!rate.steady) return "not steady, " + change_words(rate);
    return fmt::format(
        "steady from reading {} ({}) on, {}", pit.ignored_readings + rate.first_reading + 1,
        minutes_words(pit.test.readings[rate.first_reading].start_h), mean_words(rate, display));
}

/// How the last three rates go.
std::string trend_words(const InfiltrationTest& test) {
    constexpr std::size_t kLast = 3;
    const auto& readings = test.readings;
    if (readings.size() < kLast) return "has too few readings to tell whether it was steady";
    const double first = readings[readings.size() - 3].rate_mm_per_h;
    const double middle = readings[readings.size() - 2].rate_mm_per_h;
    const double last = readings.back().rate_mm_per_h;
    if (first > middle && middle > last) return "was still falling when it stopped";
    if (first < middle && middle < last) return "was rising when it stopped";
    return "was not steady when it stopped, its last rates go up and down";
}

std::string verdict(const TestFit& pit) {
    const auto& steady = pit.steady;
    if (std::ranges::none_of(steady, &SteadyRate::steady))
        return "The test " + trend_words(pit.test) +
               ": every final rate fitted to it is an extrapolation. A test that goes on until "
               "three rates in a row agree within 10 % would settle it.";
    const bool disputed = std::ranges::any_of(
        steady, [](const SteadyRate& rate) { return !rate.steady && !rate.undecided; });
    if (disputed)
        return "The test is steady by one convention and not by the other: take its final rate "
               "with care.";
    return "The test ran until it was steady, so that the readings themselves tell the final rate.";
}

std::string held_words(const TestFit& pit, const FieldFitOptions& options, const Display& display) {
    switch (options.steady_use) {
        case SteadyUse::fitted:
            return {};
        case SteadyUse::fixed:
            return "Horton's final capacity is held at " +
                   rate_words(options.fixed_rate_mm_per_h, display) + ", as given.";
        case SteadyUse::tail:
            break;
    }
    return "Horton's final capacity is held at the test's tail, " +
           mean_words(pit.tail_rate(), display) + ".";
}

/// Said here where it is no reason to warn.
std::string without_end_words(const TestFit& pit, const Display& display) {
    const bool warned = std::ranges::find(pit.warnings, FitCaution::final_depends_on_end,
                                          &FitWarning::caution) != pit.warnings.end();
    if (!pit.final_without_end || warned) return {};
    const FinalWithoutEnd& end = *pit.final_without_end;
    return fmt::format(
        "Without the last {} readings Horton's final capacity would be {} in place "
        "of {}.",
        end.left_out, rate_words(end.without_mm_per_h, display),
        rate_words(end.with_mm_per_h, display));
}

}  // namespace

std::string steady_part(const TestFit& pit, const FieldFitOptions& options,
                        const Display& display) {
    std::string out = "Steady rate\n";
    for (const SteadyRate& rate : pit.steady)
        out += filled("  " + std::string(steady_convention_words(rate.convention)) + ": ",
                      convention_words(pit, rate, display), "      ", kFitWidth);
    for (const std::string& sentence :
         {verdict(pit), held_words(pit, options, display), without_end_words(pit, display)})
        if (!sentence.empty()) out += filled("  ", sentence, "  ", kFitWidth);
    return out;
}

}  // namespace rainledger
