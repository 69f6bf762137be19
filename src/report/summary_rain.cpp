#include <string_view>
#include <variant>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/clock.hpp"
#include "report/rain_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kHangingIndent = 6;

/// The origin of a storm, in lines.
struct OriginLines {
    const Storm& storm;
    const Display& display;

    std::string operator()(std::monostate /*as given*/) const { return {}; }

    std::string operator()(const DesignOrigin& design) const {
        std::string out =
            fmt::format("{} over {} in steps of {}", pattern_words(design.pattern),
                        duration_label(design.duration_h), duration_label(design.every_h));
        if (design.peak_at)
            out += fmt::format(", peak at {} of it{}", four_figures(*design.peak_at),
                               design.peak_at_assumed ? " (assumed)" : "");
        if (!design.curve_words.empty()) out += "; " + printable(design.curve_words);
        out += "; from " + printable(design.depth_words);
        if (design.return_period_yr)
            out += ", return period " + years_text(*design.return_period_yr);
        return wrapped("  design storm: ", out, kPageWidth, kHangingIndent);
    }

    std::string operator()(const EventOrigin& origin) const {
        const RainEvent& event = origin.event;
        const std::string record = "the record " + printable(storm.file);
        std::string out = event.number == 0
                              ? "  all rain of " + record + " between two given instants\n"
                              : fmt::format("  event {} of {} in {}\n", event.number,
                                            origin.events_in_record, record);
        out += fmt::format(
            "  {} in the five days before it{}\n",
            display.depth_with_unit(event.antecedent_5_day_mm),
            event.antecedent_known ? "" : ", of which the record does not hold the whole");
        return out;
    }
};

std::string percent(double share) {
    constexpr double kWholeFrom = 9.95;
    return fixed(100.0 * share, 100.0 * share < kWholeFrom ? 1 : 0) + " %";
}

std::string resampled_line(const Storm& storm, const Display& display) {
    const ResampledFrom& from = *storm.resampled;
    const std::string lead = "  brought to steps of " + duration_label(from.every_h) + ": ";
    const double drop = 1.0 - from.peak_after_mm_per_h / from.peak_before_mm_per_h;
    constexpr double kSeenDrop = 0.0005;
    if (!(drop >= kSeenDrop)) return lead + "the peak does not change\n";
    const std::string words = fmt::format(
        "the peak falls from {} to {} {}, by {}{}", display.rate(from.peak_before_mm_per_h),
        display.rate(from.peak_after_mm_per_h), display.rate_unit(), percent(drop),
        storm.multiply_by != 1.0 ? ", before the allowance" : "");
    return wrapped(lead, words, kPageWidth, kHangingIndent);
}

std::string steps_line(const Storm& storm) {
    std::string out =
        fmt::format("  in {} step{}", storm.rain.own_steps, storm.rain.own_steps == 1 ? "" : "s");
    if (std::holds_alternative<std::monostate>(storm.origin))
        out += storm.file.empty() ? " (steps in the scenario)"
                                  : " (file " + printable(storm.file) + ")";
    return out + "\n";
}

std::string clock_lines(const Storm& storm) {
    const Hyetograph& rain = storm.rain;
    std::string out = "  begins " + iso_stamp(*rain.stamps, 0);
    const bool has_end = std::holds_alternative<EventOrigin>(storm.origin);
    if (has_end) out += ", ends " + iso_stamp(*rain.stamps, rain.own_steps);
    if (rain.clock_assumed) {
        out += has_end ? "\n  " : "; ";
        out += "the stamps carry no zone, so the clock is assumed never to change";
    }
    return out + "\n";
}

}  // namespace

std::string storm_heading(const Scenario& scenario, std::size_t i) {
    constexpr std::string_view kUnnamed = "storm";  // given under `storm:`
    const std::string& name = scenario.storms[i].name;
    std::string out = "Storm";
    if (name != kUnnamed) out += " " + printable(name);
    if (scenario.storms.size() > 1)
        out += " (" + std::to_string(i + 1) + " of " + std::to_string(scenario.storms.size()) + ")";
    return out + "\n";
}

std::string rain_part(const Storm& storm, const Display& display) {
    const Hyetograph& rain = storm.rain;
    std::string out =
        fmt::format("  {} {} of rain in {}, at most {} {}\n", display.depth(total_depth_mm(rain)),
                    display.depth_unit(), duration_text(own_duration_h(rain)),
                    display.rate(peak_intensity_mm_per_h(rain)), display.rate_unit());
    out += steps_line(storm);
    out += std::visit(OriginLines{storm, display}, storm.origin);
    if (storm.resampled) out += resampled_line(storm, display);
    if (rain.taken_as_dry_h > 0.0)
        out += fmt::format("  {} of it without data, taken as dry\n",
                           duration_text(rain.taken_as_dry_h));
    if (rain.stamps) out += clock_lines(storm);
    if (storm.multiply_by != 1.0)
        out += fmt::format("  allowance: every depth multiplied by {}, already in these figures\n",
                           four_figures(storm.multiply_by));
    if (storm.continued_h > 0.0)
        out +=
            fmt::format("  then {} of dry time (continue_for)\n", duration_text(storm.continued_h));
    return out;
}

std::string rain_closing() {
    return "\n" + std::string(kRainCaution) + "\nBy rainledger " + std::string(version()) + ".\n";
}

}  // namespace rainledger
