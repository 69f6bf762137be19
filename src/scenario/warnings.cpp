#include "rainledger/scenario/warnings.hpp"

#include <algorithm>
#include <cstddef>
#include <optional>
#include <variant>

#include "rainledger/base/number.hpp"
#include "scenario/shown.hpp"

namespace rainledger {
namespace {

constexpr double kSmallExcessMm = 12.7;  // half an inch: NEH Part 630, chapter 10 (from memory)
constexpr double kLongStepShare = 0.5;

std::string name_of(const std::string& who, const Storm& storm) {
    return storm.name == "storm" ? who : who + " in " + storm.name;
}

/// The start of the first step with rain, h.
std::optional<double> first_rain_h(const Hyetograph& rain) {
    const auto wet = std::ranges::find_if(rain.depth_mm, [](double depth) { return depth > 0.0; });
    if (wet == rain.depth_mm.end()) return std::nullopt;
    return rain.edges_h[static_cast<std::size_t>(wet - rain.depth_mm.begin())];
}

/// The length of the step in which `instant_h` lies, the earlier one at an edge.
double step_length_at(const Hyetograph& rain, double instant_h) {
    const auto edge = std::lower_bound(rain.edges_h.begin() + 1, rain.edges_h.end() - 1, instant_h);
    return rain.duration_h[static_cast<std::size_t>(edge - rain.edges_h.begin()) - 1];
}

/// What there is to say of a curve number's excess; empty: nothing.
std::string small_excess(const Surface& surface, const SurfaceLedger& ledger) {
    const double excess = ledger.total.excess_mm;
    if (!std::holds_alternative<CurveNumber>(surface.losses)) return {};
    if (ledger.total.rain_mm == 0.0 || excess >= kSmallExcessMm) return {};
    return "a curve number answers poorly under 12.7 mm of excess, and this is " +
           fixed(excess, 1) + " mm";
}

/// A duration to the minute, as people read times.
std::string minutes(double hours) {
    return hours * 60.0 < 0.5 ? "half a minute" : fixed(hours * 60.0, 0) + " min";
}

/// What there is to say of the step in which a surface first ponds; empty: nothing.
std::string long_step(const Storm& storm, const Surface& surface, const SurfaceLedger& ledger) {
    const auto rain_h = first_rain_h(storm.rain);
    if (!rain_h || ledger.ponding.empty()) return {};
    if (std::holds_alternative<Impervious>(surface.losses)) return {};
    const double until_ponding_h = ledger.ponding.front().start_h - *rain_h;
    const double step_h = step_length_at(storm.rain, ledger.ponding.front().start_h);
    if (!(until_ponding_h > 0.0) || !(step_h > kLongStepShare * until_ponding_h)) return {};
    return "the rain's step of " + minutes(step_h) + " is long against the " +
           minutes(until_ponding_h) +
           " from first rain to ponding; finer rain would pond at another time";
}

}  // namespace

void warn_of_results(const Scenario& scenario, const Storm& storm, const SiteLedger& ledger,
                     Diagnostics& diagnostics) {
    // Of an event out of a record, reading it has said so.
    const bool is_event = std::holds_alternative<EventOrigin>(storm.origin);
    if (storm.rain.taken_as_dry_h > 0.0 && !is_event)
        diagnostics.warning(storm.place, storm.name + ": " + minutes(storm.rain.taken_as_dry_h) +
                                             " of the record had no values and were taken as dry");
    for (std::size_t i = 0; i < scenario.site.surfaces.size(); ++i) {
        const Surface& surface = scenario.site.surfaces[i];
        for (const std::string& text : {small_excess(surface, ledger.surfaces[i]),
                                        long_step(storm, surface, ledger.surfaces[i])})
            if (!text.empty())
                diagnostics.warning(scenario.places[i].surface,
                                    name_of(surface.name, storm) + ": " + text);
    }
    if (ledger.coarse_run_on)
        diagnostics.warning(storm.place,
                            name_of("site", storm) +
                                ": run-on below a surface that infiltrates is handed over in parts "
                                "of a step that leave the accounts below it uncertain by " +
                                three_figures(ledger.coarse_run_on->difference_mm) + " mm");
}

void report_unmatched(const Scenario& scenario, const Storm& storm, const SiteLedger& ledger,
                      Diagnostics& diagnostics) {
    for (const UnmatchedPhi& fault : ledger.unmatched) {
        const std::string where = storm.name == "storm" ? "" : " in storm '" + storm.name + "'";
        diagnostics.error(
            scenario.places[fault.surface].observed_excess,
            "more excess observed (" + brief(fault.observed_mm) +
                " mm) than any loss rate leaves (" + brief(fault.most_mm) + " mm at rate 0)" +
                where,
            "check the observed excess, the rain, and the stores that come before the "
            "rate");
    }
}

}  // namespace rainledger
