#include "rainledger/report/storm_summary.hpp"

#include <algorithm>
#include <cstddef>
#include <string_view>
#include <variant>

#include <fmt/core.h>

#include "rainledger/rain/rain_windows.hpp"
#include "rainledger/report/caution.hpp"
#include "report/rain_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;
constexpr std::size_t kHangingIndent = 6;
constexpr double kSameTime = 1.0 + 1.0e-9;  // durations alike but for rounding

std::string peaks_part(const Hyetograph& rain, const Display& display) {
    const double step_h = heaviest_step_h(rain);
    bool any_short = false;
    TextTable table;
    table.column("within", Align::left);
    table.column(display.depth_unit(), Align::point);
    table.column(display.rate_unit(), Align::point);
    for (const int minutes : kPeakMinutes) {
        const double window_h = minutes / kMinutesPerHour;
        const double depth_mm = largest_window_depth_mm(rain, window_h);
        const bool is_short = window_h * kSameTime < step_h;
        any_short = any_short || is_short;
        table.row({fmt::format("{} min{}", minutes, is_short ? " *" : ""), display.depth(depth_mm),
                   display.rate(depth_mm / window_h)});
    }
    std::string out = "Heaviest rain\n" + table.text();
    if (any_short)
        out += fmt::format("  * less than the step of {}: the mean of the step, not a peak\n",
                           duration_label(step_h));
    return out;
}

/// What came after the design and does not show in its table.
std::string later_changes(const Storm& storm) {
    if (storm.multiply_by != 1.0 && storm.resampled) return ", before the allowance and new steps";
    if (storm.multiply_by != 1.0) return ", before the allowance";
    return storm.resampled ? ", before the new steps" : "";
}

std::string held_verdict(const std::vector<HeldStatistic>& held) {
    constexpr double kWithinRounding = 1.0 - 1.0e-9;
    std::string missed;
    for (const HeldStatistic& one : held)
        if (one.storm_mm < kWithinRounding * one.statistic_mm)
            missed += (missed.empty() ? "" : ", ") + duration_label(one.duration_h);
    if (missed.empty()) return "  The storm holds the depth of every duration listed.\n";
    return wrapped("  The storm does not hold the depth of: ", missed, kPageWidth, kHangingIndent);
}

std::string held_part(const Storm& storm, const Display& display) {
    const auto* design = std::get_if<DesignOrigin>(&storm.origin);
    if (design == nullptr || design->held.empty()) return {};
    TextTable table;
    table.column("duration", Align::left);
    table.column("statistic", Align::point);
    table.column("storm", Align::point);
    for (const HeldStatistic& one : design->held)
        table.row({duration_label(one.duration_h), display.depth(one.statistic_mm),
                   display.depth(one.storm_mm)});
    return fmt::format("\nDepths by duration, of the statistics and of the storm ({}){}\n",
                       display.depth_unit(), later_changes(storm)) +
           table.text() + held_verdict(design->held);
}

std::string rarity_verdict(const DurationRarity& rarest) {
    if (is_common(rarest.rarity))
        return "  Over no duration as rare as " + years_text(*rarest.rarity.less_than) + ".\n";
    return fmt::format("  Rarest over {}: {}.\n", duration_label(rarest.duration_h),
                       rarity_words(rarest.rarity));
}

std::string rarity_part(const Storm& storm, const Display& display) {
    const auto* origin = std::get_if<EventOrigin>(&storm.origin);
    if (origin == nullptr || !origin->rarity || origin->rarity->by_duration.empty()) return {};
    const EventRarity& rarity = *origin->rarity;
    TextTable table;
    table.column("duration", Align::left);
    table.column(display.depth_unit(), Align::point);
    table.column("return period", Align::left);
    for (const DurationRarity& one : rarity.by_duration)
        table.row({duration_label(one.duration_h), display.depth(one.depth_mm),
                   rarity_words(one.rarity)});
    return "\nHow rare the event was" + later_changes(storm) + "\n" + table.text() +
           rarity_verdict(rarity.by_duration[rarity.rarest]);
}

}  // namespace

std::string storm_summary(const Scenario& scenario, const SummaryOptions& options) {
    const Display display(options.units);
    std::string out = scenario.title.empty() ? "Storms\n" : printable(scenario.title) + "\n";
    for (std::size_t i = 0; i < scenario.storms.size(); ++i) {
        const Storm& storm = scenario.storms[i];
        out += "\n" + storm_heading(scenario, i) + rain_part(storm, display);
        out += "\n" + peaks_part(storm.rain, display);
        out += held_part(storm, display);
        out += rarity_part(storm, display);
    }
    return out + rain_closing();
}

}  // namespace rainledger
