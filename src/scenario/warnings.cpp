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

void warn_small_excess(const std::string& name, const Surface& surface, const SurfaceLedger& ledger,
                       std::vector<std::string>& warnings) {
    const double excess = ledger.total.excess_mm;
    if (!std::holds_alternative<CurveNumber>(surface.losses)) return;
    if (excess > 0.0 && excess < kSmallExcessMm)
        warnings.push_back(name +
                           ": a curve number answers poorly under 12.7 mm of excess, and this is " +
                           fixed(excess, 1) + " mm");
}

void warn_long_step(const std::string& name, const Storm& storm, const Surface& surface,
                    const SurfaceLedger& ledger, std::vector<std::string>& warnings) {
    const auto rain_h = first_rain_h(storm.rain);
    if (!rain_h || ledger.ponding.empty()) return;
    if (std::holds_alternative<Impervious>(surface.losses)) return;
    const double until_ponding_h = ledger.ponding.front().start_h - *rain_h;
    const double step_h = step_length_at(storm.rain, ledger.ponding.front().start_h);
    if (!(until_ponding_h > 0.0) || !(step_h > kLongStepShare * until_ponding_h)) return;
    warnings.push_back(name + ": the rain's step of " + brief_time(step_h) +
                       " is long against the " + three_figures(until_ponding_h * 60.0) +
                       " min from first rain to ponding; finer rain would pond at another time");
}

}  // namespace

std::vector<std::string> result_warnings(const Storm& storm, const Site& site,
                                         const SiteLedger& ledger) {
    std::vector<std::string> warnings;
    if (storm.rain.taken_as_dry_h > 0.0)
        warnings.push_back(storm.name + ": " + brief_time(storm.rain.taken_as_dry_h) +
                           " of the record had no values and were taken as dry");
    for (std::size_t i = 0; i < site.surfaces.size(); ++i) {
        const Surface& surface = site.surfaces[i];
        const std::string name = name_of(surface.name, storm);
        warn_small_excess(name, surface, ledger.surfaces[i], warnings);
        warn_long_step(name, storm, surface, ledger.surfaces[i], warnings);
    }
    if (ledger.coarse_run_on)
        warnings.push_back(name_of("site", storm) +
                           ": run-on below a surface that infiltrates is handed over in parts of a "
                           "step that leave the accounts below it uncertain by " +
                           shortest(ledger.coarse_run_on->difference_mm) + " mm");
    return warnings;
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
