#include <algorithm>
#include <cmath>
#include <cstddef>
#include <variant>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/loss_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr double kClosureTolerance = 1.0e-9;  // mm, times rain and run-on where over 1 mm
constexpr double kMmPerMetre = 1000.0;
constexpr std::size_t kHangingIndent = 6;

struct Worst {
    double closure_mm = 0.0;
    std::string where;
};

Worst worst_closure(const StormOnSite& on) {
    Worst worst;
    const auto look = [&](double closure_mm, const std::string& where) {
        // One that is no number is the worst there is.
        if (std::isnan(worst.closure_mm) || closure_mm <= worst.closure_mm) return;
        worst = {closure_mm, where};
    };
    for (std::size_t i = 0; i < on.site.surfaces.size(); ++i)
        look(on.ledger.surfaces[i].closure_mm, printable(on.site.surfaces[i].name));
    for (const PlaceLedger& place : on.ledger.places)
        look(place.closure_mm, place_label(place));
    look(on.ledger.site.closure_mm, "whole site");
    return worst;
}

std::string balance_line(const StormOnSite& on) {
    const Worst worst = worst_closure(on);
    double supply_mm = total_depth_mm(on.storm.rain);
    for (const SurfaceLedger& surface : on.ledger.surfaces)
        supply_mm = std::max(supply_mm, surface.total.rain_mm + surface.total.run_on_mm);
    if (worst.closure_mm <= kClosureTolerance * std::max(1.0, supply_mm))
        return "  The books balance.\n";
    return fmt::format("  The books do not balance: they are off by as much as {:.2g} mm ({}).\n",
                       worst.closure_mm, worst.where);
}

std::string left_ponded_lines(const StormOnSite& on) {
    std::string list;
    for (std::size_t i = 0; i < on.site.surfaces.size(); ++i) {
        const Surface& surface = on.site.surfaces[i];
        const double depth_mm = on.ledger.surfaces[i].total.ponded_mm;
        if (!(depth_mm > 0.0)) continue;
        if (!list.empty()) list += ", ";
        list += fmt::format(
            "{} on {} ({} {}{})", on.display.depth_with_unit(depth_mm), printable(surface.name),
            on.display.volume(depth_mm * surface.area_m2 / kMmPerMetre), on.display.volume_unit(),
            surface.ponded_water == PondedWater::held ? ", held" : "");
    }
    if (list.empty()) return {};
    return wrapped("  Still ponded at the end: ", list, kPageWidth, kHangingIndent);
}

std::string phi_lines(const StormOnSite& on) {
    std::string out;
    for (std::size_t i = 0; i < on.site.surfaces.size(); ++i) {
        const auto& rate = on.ledger.surfaces[i].phi_index_mm_per_h;
        if (!rate) continue;
        const auto& phi = std::get<PhiIndex>(on.site.surfaces[i].losses);
        out += fmt::format("  Phi index of {}: {} leaves the observed excess of {}\n",
                           printable(on.site.surfaces[i].name),
                           on.display.parameter(*rate, Dimension::rate),
                           on.display.parameter(phi.observed_excess_mm, Dimension::depth));
    }
    return out;
}

std::string runs_onto_words(const Site& site, const Surface& surface) {
    std::string out;
    for (const RunsOnto& onto : surface.runs_onto) {
        const std::string share =
            onto.share == 1.0 ? "all" : four_figures(100.0 * onto.share) + " %";
        out += fmt::format("; {} of its excess runs onto {}", share,
                           printable(site.surfaces[onto.surface].name));
    }
    return out;
}

std::string assumptions_of(const Site& site, const Surface& surface, const Display& display) {
    std::string out = assumption_words(surface.losses, display);
    if (surface.interception_mm > 0.0)
        out += "; interception " + display.parameter(surface.interception_mm, Dimension::depth);
    if (surface.depression_storage_mm > 0.0) {
        out += "; depression storage " +
               display.parameter(surface.depression_storage_mm, Dimension::depth);
        if (surface.ponded_water == PondedWater::held)
            out += ", held";
        else if (can_pond(surface.losses))
            out += ", which infiltrates";
    }
    return out + runs_onto_words(site, surface);
}

}  // namespace

std::string closing_part(const StormOnSite& on) {
    return phi_lines(on) + left_ponded_lines(on) + balance_line(on);
}

std::string assumptions_part(const Site& site, const Display& display) {
    const bool one_place =
        std::all_of(site.surfaces.begin(), site.surfaces.end(), [&](const Surface& surface) {
            return surface.drains_to == site.surfaces.front().drains_to;
        });
    std::string out = "Assumptions\n";
    for (const Surface& surface : site.surfaces) {
        std::string lead = "  " + printable(surface.name);
        if (!one_place) lead += " (to " + printable(surface.drains_to) + ")";
        out += wrapped(lead + ": ", assumptions_of(site, surface, display), kPageWidth,
                       kHangingIndent);
    }
    return out;
}

}  // namespace rainledger
