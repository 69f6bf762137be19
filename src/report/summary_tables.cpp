#include <algorithm>
#include <cstddef>
#include <string_view>
#include <vector>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/clock.hpp"
#include "report/loss_words.hpp"
#include "report/rain_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

/// One row of both tables: a surface, a place drained to, or the site.
struct Area {
    std::string label;
    std::string method;
    double area_m2;
    const Accounts* total;
    const ExcessFigures* figures;
};

std::vector<Area> surface_areas(const StormOnSite& on) {
    std::vector<Area> areas;
    for (std::size_t i = 0; i < on.site.surfaces.size(); ++i) {
        const Surface& surface = on.site.surfaces[i];
        const SurfaceLedger& ledger = on.ledger.surfaces[i];
        areas.push_back({printable(surface.name), method_words(surface.losses), surface.area_m2,
                         &ledger.total, &ledger.figures});
    }
    return areas;
}

std::vector<Area> joint_areas(const StormOnSite& on) {
    std::vector<Area> areas;
    for (const JointPlace& joint : joint_places(on.ledger))
        areas.push_back(
            {joint.label, "", joint.ledger->area_m2, &joint.ledger->total, &joint.ledger->figures});
    return areas;
}

template <class CellsOf>
void add_rows(TextTable& table, const StormOnSite& on, CellsOf cells_of) {
    for (const Area& area : surface_areas(on))
        table.row(cells_of(area));
    table.rule();
    for (const Area& area : joint_areas(on))
        table.row(cells_of(area));
}

bool has_run_on(const StormOnSite& on) {
    return std::any_of(on.site.surfaces.begin(), on.site.surfaces.end(),
                       [](const Surface& surface) { return !surface.runs_onto.empty(); });
}

bool sends_more_than_arrives(const StormOnSite& on) {
    return std::any_of(on.ledger.places.begin(), on.ledger.places.end(),
                       [&](const PlaceLedger& place) {
                           return on.display.depth(place.total.run_on_mm).starts_with('-');
                       });
}

}  // namespace

std::string place_label(const PlaceLedger& place) {
    return "to " + printable(place.name);
}

std::vector<JointPlace> joint_places(const SiteLedger& ledger) {
    std::vector<JointPlace> places;
    for (const PlaceLedger& place : ledger.places)
        places.push_back({place_label(place), &place});
    if (places.size() == 1)
        places.front().label = "whole site, " + places.front().label;
    else
        places.push_back({"whole site", &ledger.site});
    return places;
}

std::string accounts_part(const StormOnSite& on) {
    const Display& display = on.display;
    const std::string_view area_unit = display.area_unit(on.ledger.site.area_m2);
    TextTable table;
    table.column("surface", Align::left);
    table.column(fmt::format("area|{}", area_unit), Align::point);
    table.column("losses", Align::left);
    for (const std::string_view heading :
         {"rain", "run-on", "initial|loss", "infil-|trated", "left|ponded", "excess"})
        table.column(heading, Align::point);
    add_rows(table, on, [&](const Area& area) {
        const Accounts& total = *area.total;
        return std::vector<std::string>{
            area.label,
            display.area(area.area_m2, area_unit),
            area.method,
            display.depth(total.rain_mm),
            display.depth(total.run_on_mm),
            display.depth(total.initial_loss_mm),
            display.depth(total.infiltrated_mm),
            display.depth(total.ponded_mm),
            display.depth(total.excess_mm),
        };
    });
    std::string out =
        fmt::format("Where the water went ({} over each area)\n", display.depth_words());
    out += table.text();
    if (sends_more_than_arrives(on))
        out += "  Run-on below zero: more is sent to surfaces that drain elsewhere than arrives.\n";
    return out;
}

std::string excess_part(const StormOnSite& on) {
    const Display& display = on.display;
    TextTable table;
    table.column("surface", Align::left);
    table.column(fmt::format("excess|{}", display.depth_unit()), Align::point);
    table.column(fmt::format("volume|{}", display.volume_unit()), Align::point);
    table.column("runoff|coeff. *", Align::point);
    for (const int minutes : kWindowsMinutes)
        table.column(fmt::format("worst {}|min, {}", minutes, display.flow_unit()), Align::point);
    add_rows(table, on, [&](const Area& area) {
        const ExcessFigures& figures = *area.figures;
        const auto& coefficient = figures.volumetric_runoff_coefficient;
        std::vector<std::string> cells{area.label, display.depth(area.total->excess_mm),
                                       display.volume(figures.excess_volume_m3),
                                       coefficient ? fixed(*coefficient, 2) : "-"};
        for (const double flow : figures.worst_flow_l_per_s)
            cells.push_back(display.flow(flow));
        return cells;
    });
    std::string out = "What the excess amounts to\n" + table.text() +
                      "  * volumetric: volume of excess over volume of rain; not the C of the "
                      "rational method\n"
                      "  Flows are the excess averaged over the worst minutes, before any travel "
                      "time.\n";
    const double step_h = heaviest_step_h(on.storm.rain);
    constexpr double kShortestWindowH = kWindowsMinutes.front() / 60.0;
    if (step_h > 1.2 * kShortestWindowH)
        out += fmt::format(
            "  The heaviest rain is an average over its step of {}; over fewer minutes the flow\n"
            "  may have been higher.\n",
            duration_text(step_h));
    if (has_run_on(on))
        out +=
            "  Excess that runs onto another surface stands in both rows (whose coefficient can\n"
            "  pass 1); a place and the whole site count it once.\n";
    return out;
}

}  // namespace rainledger
