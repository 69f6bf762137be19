#include "scenario/reading_warnings.hpp"

#include <algorithm>
#include <string>
#include <variant>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"
#include "scenario/shown.hpp"

namespace rainledger {
namespace {

constexpr double kHighIntensity = 2000.0;  // mm/h; the most in a minute on record is below it
constexpr double kHighDepthMm = 2000.0;
constexpr double kShortStormH = 6.0;
constexpr double kMostRunOnRatio = 2.0;
constexpr double kRatioRoom = 1.0e-9;  // areas in acres or hectares carry roundings
constexpr double kBurstShare = 0.5;

/// " of storm 'x'", or nothing for the one storm of a scenario.
std::string of_storm(const Storm& storm) {
    return storm.name == "storm" ? "" : " of storm " + in_quotes(storm.name);
}

void warn_high_rain(const Storm& read, Diagnostics& diagnostics) {
    const double peak = peak_intensity_mm_per_h(read.rain);
    const double depth = total_depth_mm(read.rain);
    if (peak > kHighIntensity)
        diagnostics.warning(read.place,
                            "the largest intensity" + of_storm(read) + " is " + brief(peak) +
                                " mm/h, above 2000 mm/h",
                            "check the unit of the rain and the length of its steps");
    if (depth > kHighDepthMm)
        diagnostics.warning(
            read.place, "the depth" + of_storm(read) + " is " + brief(depth) + " mm, above 2000 mm",
            "check the unit of the rain, and that it is not cumulative");
}

/// Whether some surface takes losses that rain before the burst would have filled or spent.
bool has_initial_losses(const Surface& surface) {
    return surface.interception_mm > 0.0 || surface.depression_storage_mm > 0.0 ||
           !std::holds_alternative<Impervious>(surface.losses);
}

/// Whether the first wet step is already near the peak, with more rain to follow.
bool starts_with_its_burst(const Hyetograph& rain) {
    const double peak = peak_intensity_mm_per_h(rain);
    const double* first = std::find_if(rain.depth_mm.data(), rain.depth_mm.data() + rain.own_steps,
                                       [](double depth) { return depth > 0.0; });
    const auto step = static_cast<std::size_t>(first - rain.depth_mm.data());
    const auto wet = std::ranges::count_if(rain.depth_mm, [](double depth) { return depth > 0.0; });
    return wet > 1 && rain.intensity_mm_per_h(step) >= kBurstShare * peak;
}

void warn_burst(const Storm& read, const std::vector<ReadSurface>& surfaces,
                Diagnostics& diagnostics) {
    if (!starts_with_its_burst(read.rain)) return;
    const bool lossy = std::ranges::any_of(
        surfaces, [](const ReadSurface& each) { return has_initial_losses(each.surface); });
    if (!lossy) return;
    diagnostics.warning(read.place,
                        "a burst without the rain before it: the first wet step" + of_storm(read) +
                            " has half the peak intensity or more",
                        "full initial losses meet the burst; give the whole storm, or start with "
                        "smaller losses");
}

/// The storms shorter than the curve number's own time: "2 h" or "'a' (2 h), 'b' (1 h)".
std::string short_storms(const std::vector<Storm>& storms) {
    std::string out;
    for (const Storm& read : storms) {
        const double hours = own_duration_h(read.rain);
        if (hours >= kShortStormH) continue;
        const std::string text = brief_time(hours);
        if (read.name == "storm") return text;
        out += (out.empty() ? "" : ", ") + in_quotes(read.name) + " (" + text + ")";
    }
    return out;
}

void warn_short_storms(const std::vector<Storm>& storms, const std::vector<ReadSurface>& surfaces,
                       Diagnostics& diagnostics) {
    const std::string names = short_storms(storms);
    if (names.empty()) return;
    for (const ReadSurface& read : surfaces)
        if (std::holds_alternative<CurveNumber>(read.surface.losses))
            diagnostics.warning(
                read.law,
                "surface " + in_quotes(read.surface.name) +
                    " has a curve number in a storm under 6 h: " + names,
                "the method was drawn from daily totals and says little about rates "
                "within a short storm");
}

void warn_run_on(const std::vector<ReadSurface>& surfaces, Diagnostics& diagnostics) {
    std::vector<double> arriving_m2(surfaces.size(), 0.0);
    for (const ReadSurface& giver : surfaces)
        for (const RunsOnto& onto : giver.surface.runs_onto)
            arriving_m2[onto.surface] += onto.share * giver.surface.area_m2;
    for (std::size_t i = 0; i < surfaces.size(); ++i) {
        const double ratio = arriving_m2[i] / surfaces[i].surface.area_m2;
        if (ratio > kMostRunOnRatio * (1.0 + kRatioRoom))
            diagnostics.warning(surfaces[i].places.surface,
                                "surface " + in_quotes(surfaces[i].surface.name) +
                                    " takes run-on from " + three_figures(ratio) +
                                    " times its own area, over 2:1",
                                "run-on is spread evenly here; in the field much of it would cross "
                                "in a few paths");
    }
}

}  // namespace

void warn_about_scenario(const std::vector<Storm>& storms, const std::vector<ReadSurface>& surfaces,
                         Diagnostics& diagnostics) {
    for (const Storm& read : storms) {
        warn_high_rain(read, diagnostics);
        warn_burst(read, surfaces, diagnostics);
    }
    warn_short_storms(storms, surfaces, diagnostics);
    warn_run_on(surfaces, diagnostics);
}

}  // namespace rainledger
