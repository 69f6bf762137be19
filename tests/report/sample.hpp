#pragma once

#include <limits>
#include <string>
#include <vector>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// Hand-made scenarios and ledgers: only their form matters, not their hydrology.
namespace rainledger::sample {

inline constexpr double kNone = std::numeric_limits<double>::quiet_NaN();
inline constexpr double kUnlimited = std::numeric_limits<double>::infinity();

inline Surface verge() {
    Surface surface;
    surface.name = "verge";
    surface.area_m2 = 1600.0;
    surface.drains_to = "CB-2";
    surface.interception_mm = 1.0;
    surface.depression_storage_mm = 4.0;
    surface.losses = GreenAmpt{10.9, 22.0};
    return surface;
}

inline Surface parking() {
    Surface surface;
    surface.name = "parking";
    surface.area_m2 = 4800.0;
    surface.drains_to = "CB-2";
    surface.depression_storage_mm = 1.5;
    surface.losses = Impervious{};
    surface.runs_onto = {{0, 0.3}};
    return surface;
}

inline Hyetograph two_steps() {
    return make_hyetograph({0.0, 5.0, 10.0}, "min", {0.4, 12.5});
}

/// Two steps from 2026-03-04 23:50 at UTC+1.
inline Hyetograph two_stamped_steps() {
    StampedEdges edges;
    edges.unix_ms = {1772664600000, 1772664900000, 1772665200000};
    edges.offset_minutes = {60, 60, 60};
    edges.has_offset = true;
    return make_hyetograph(std::move(edges), {0.4, 12.5});
}

inline Storm storm_of(Hyetograph rain) {
    Storm storm;
    storm.name = "storm";
    storm.rain = std::move(rain);
    return storm;
}

inline Scenario verge_and_parking(Hyetograph rain) {
    Scenario scenario;
    scenario.title = "Tannery Lane car park";
    scenario.storms = {storm_of(std::move(rain))};
    scenario.site.surfaces = {verge(), parking()};
    return scenario;
}

inline SurfaceLedger verge_ledger() {
    SurfaceLedger ledger;
    ledger.rows = {{{0.4, 0.0, 0.4, 0.0, 0.0, 0.0}, kUnlimited},
                   {{12.5, 9.0, 0.6, 8.25, 4.0, 8.65}, 32.5}};
    ledger.total = {12.9, 9.0, 1.0, 8.25, 4.0, 8.65};
    ledger.ponding = {{0.1, {}}};
    ledger.runoff_start_h = 0.125;
    ledger.closure_mm = 1.0e-15;
    ledger.figures = {13.84, 8.65 / 12.9, 103.8, {46.1, 23.1, 15.4, 7.69}};
    return ledger;
}

inline SurfaceLedger parking_ledger() {
    SurfaceLedger ledger;
    ledger.rows = {{{0.4, 0.0, 0.0, 0.0, 0.4, 0.0}, 0.0}, {{12.5, 0.0, 0.0, 0.0, 1.5, 11.4}, 0.0}};
    ledger.total = {12.9, 0.0, 0.0, 0.0, 1.5, 11.4};
    ledger.runoff_start_h = 0.0907;
    ledger.figures = {54.72, 11.4 / 12.9, 136.8, {182.4, 91.2, 60.8, 30.4}};
    return ledger;
}

inline PlaceLedger joint(std::string name) {
    PlaceLedger place;
    place.name = std::move(name);
    place.area_m2 = 6400.0;
    place.rows = {{{0.4, 0.0, 0.1, 0.0, 0.3, 0.0}, kNone},
                  {{12.5, 0.0, 0.15, 2.0625, 2.125, 8.4625}, kNone}};
    place.total = {12.9, 0.0, 0.25, 2.0625, 2.125, 8.4625};
    place.ponding_start_h = 0.1;
    place.runoff_start_h = 0.0907;
    place.closure_mm = 2.0e-15;
    place.figures = {54.16, 8.4625 / 12.9, 101.55, {180.5, 90.3, 60.2, 30.1}};
    return place;
}

inline SiteLedger ledger_of_both() {
    SiteLedger ledger;
    ledger.surfaces = {verge_ledger(), parking_ledger()};
    ledger.places = {joint("CB-2")};
    ledger.site = joint("");
    return ledger;
}

}  // namespace rainledger::sample
