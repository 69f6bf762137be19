#include "rainledger/report/json.hpp"

#include <cstddef>
#include <utility>

#include "rainledger/report/caution.hpp"
#include "report/json_parameters.hpp"
#include "report/json_rain.hpp"
#include "report/json_writer.hpp"

namespace rainledger {
namespace {

void write_accounts(JsonWriter& json, const Accounts& total) {
    json.member("rain_mm", total.rain_mm);
    json.member("run_on_mm", total.run_on_mm);
    json.member("initial_loss_mm", total.initial_loss_mm);
    json.member("infiltrated_mm", total.infiltrated_mm);
    json.member("ponded_mm", total.ponded_mm);
    json.member("loss_mm", total.rain_mm + total.run_on_mm - total.excess_mm);
    json.member("excess_mm", total.excess_mm);
}

void write_figures(JsonWriter& json, const ExcessFigures& figures) {
    json.member("excess_volume_m3", figures.excess_volume_m3);
    json.member("volumetric_runoff_coefficient", figures.volumetric_runoff_coefficient);
    json.member("peak_excess_mm_per_h", figures.peak_excess_mm_per_h);
    json.key("worst_flow_l_per_s");
    json.begin_object();
    for (std::size_t i = 0; i < kWindowsMinutes.size(); ++i)
        json.member(std::to_string(kWindowsMinutes[i]), figures.worst_flow_l_per_s[i]);
    json.end_object();
}

void write_ponding(JsonWriter& json, const std::vector<PondedInterval>& ponding) {
    json.begin_array();
    for (const PondedInterval& interval : ponding) {
        json.begin_object();
        json.member("start_h", interval.start_h);
        json.member("end_h", interval.end_h);
        json.end_object();
    }
    json.end_array();
}

void write_surface(JsonWriter& json, const Site& site, const Surface& surface,
                   const SurfaceLedger& ledger) {
    json.begin_object();
    json.member("area_m2", surface.area_m2);
    json.member("drains_to", surface.drains_to);
    json.member("method", method_key(surface.losses));
    json.key("parameters");
    write_parameters(json, surface.losses, ledger.phi_index_mm_per_h);
    json.member("interception_mm", surface.interception_mm);
    json.member("depression_storage_mm", surface.depression_storage_mm);
    json.member("ponded_water", surface.ponded_water == PondedWater::held ? "held" : "infiltrates");
    json.key("runs_onto");
    json.begin_object();
    for (const RunsOnto& onto : surface.runs_onto)
        json.member(site.surfaces[onto.surface].name, onto.share);
    json.end_object();
    write_accounts(json, ledger.total);
    json.key("ponding");
    write_ponding(json, ledger.ponding);
    json.member("runoff_start_h", ledger.runoff_start_h);
    write_figures(json, ledger.figures);
    json.member("closure_mm", ledger.closure_mm);
    json.end_object();
}

void write_place(JsonWriter& json, const PlaceLedger& place) {
    json.begin_object();
    json.member("area_m2", place.area_m2);
    write_accounts(json, place.total);
    json.member("ponding_start_h", place.ponding_start_h);
    json.member("runoff_start_h", place.runoff_start_h);
    write_figures(json, place.figures);
    json.member("closure_mm", place.closure_mm);
    json.end_object();
}

void write_storm(JsonWriter& json, const Site& site, const Storm& storm, const SiteLedger& ledger) {
    json.begin_object();
    json.key("rain");
    write_rain(json, storm);
    json.key("surfaces");
    json.begin_object();
    for (std::size_t i = 0; i < site.surfaces.size(); ++i) {
        json.key(site.surfaces[i].name);
        write_surface(json, site, site.surfaces[i], ledger.surfaces[i]);
    }
    json.end_object();
    json.key("drains_to");
    json.begin_object();
    for (const PlaceLedger& place : ledger.places) {
        json.key(place.name);
        write_place(json, place);
    }
    json.end_object();
    json.key("site");
    write_place(json, ledger.site);
    json.end_object();
}

}  // namespace

std::string results_json(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                         std::span<const std::string> warnings) {
    JsonWriter json;
    begin_results(json, scenario.title);
    json.key("storms");
    json.begin_object();
    for (std::size_t i = 0; i < scenario.storms.size(); ++i) {
        json.key(scenario.storms[i].name);
        write_storm(json, scenario.site, scenario.storms[i], ledgers[i]);
    }
    json.end_object();
    end_results(json, warnings, kCaution);
    return std::move(json).take();
}

}  // namespace rainledger
