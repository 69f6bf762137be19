#include "rainledger/report/json.hpp"

#include <nlohmann/json.hpp>

#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/sample.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using nlohmann::ordered_json;

ordered_json json_of(const Scenario& scenario, const SiteLedger& ledger) {
    const std::vector<SiteLedger> ledgers(scenario.storms.size(), ledger);
    const std::vector<std::string> warnings{"verge: take care"};
    return ordered_json::parse(results_json(scenario, ledgers, warnings));
}

/// The parameters written for one way to lose rain.
ordered_json parameters_of(const Losses& losses, std::string_view method) {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    scenario.site.surfaces[0].losses = losses;
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].phi_index_mm_per_h = 7.5;
    const ordered_json surface = json_of(scenario, ledger)["storms"]["storm"]["surfaces"]["verge"];
    CHECK(surface["method"] == method);
    return surface["parameters"];
}

std::vector<std::string> keys_of(const ordered_json& object) {
    std::vector<std::string> keys;
    for (const auto& item : object.items())
        keys.push_back(item.key());
    return keys;
}

}  // namespace

TEST_CASE("the JSON has the shape that programs rely on") {
    const ordered_json json =
        json_of(sample::verge_and_parking(sample::two_steps()), sample::ledger_of_both());
    CHECK(json["title"] == "Tannery Lane car park");
    CHECK(json["program"]["name"] == "rainledger");
    CHECK(json["program"]["version"] == version());
    CHECK(json["warnings"] == ordered_json{"verge: take care"});
    CHECK(json["caution"] == kCaution);

    const ordered_json& storm = json["storms"]["storm"];
    CHECK(keys_of(storm) == std::vector<std::string>{"rain", "surfaces", "drains_to", "site"});
    CHECK(storm["rain"]["depth_mm"] == 12.9);
    CHECK(storm["rain"]["duration_h"] == 10.0 / 60.0);
    CHECK(storm["rain"]["peak_intensity_mm_per_h"] == 150.0);
    CHECK(storm["rain"]["steps"] == 2);
    CHECK(storm["rain"]["starts"].is_null());
    CHECK(keys_of(storm["surfaces"]) == std::vector<std::string>{"verge", "parking"});
    CHECK(keys_of(storm["drains_to"]) == std::vector<std::string>{"CB-2"});
    CHECK(storm["site"] == storm["drains_to"]["CB-2"]);
}

TEST_CASE("a surface in JSON carries its accounts, instants and figures") {
    const ordered_json surfaces = json_of(sample::verge_and_parking(sample::two_steps()),
                                          sample::ledger_of_both())["storms"]["storm"]["surfaces"];
    const ordered_json& verge = surfaces["verge"];
    CHECK(verge["area_m2"] == 1600.0);
    CHECK(verge["drains_to"] == "CB-2");
    CHECK(verge["interception_mm"] == 1.0);
    CHECK(verge["depression_storage_mm"] == 4.0);
    CHECK(verge["ponded_water"] == "infiltrates");
    CHECK(verge["rain_mm"] == 12.9);
    CHECK(verge["run_on_mm"] == 9.0);
    CHECK(verge["initial_loss_mm"] == 1.0);
    CHECK(verge["infiltrated_mm"] == 8.25);
    CHECK(verge["ponded_mm"] == 4.0);
    CHECK(verge["loss_mm"] == 12.9 + 9.0 - 8.65);
    CHECK(verge["excess_mm"] == 8.65);
    CHECK(verge["ponding"] == ordered_json::parse(R"([{"start_h": 0.1, "end_h": null}])"));
    CHECK(verge["runoff_start_h"] == 0.125);
    CHECK(verge["excess_volume_m3"] == 13.84);
    CHECK(verge["volumetric_runoff_coefficient"] == 8.65 / 12.9);
    CHECK(verge["peak_excess_mm_per_h"] == 103.8);
    CHECK(verge["worst_flow_l_per_s"] ==
          ordered_json::parse(R"({"5": 46.1, "10": 23.1, "15": 15.4, "30": 7.69})"));
    CHECK(verge["closure_mm"] == 1.0e-15);
    CHECK(surfaces["parking"]["runs_onto"] == ordered_json::parse(R"({"verge": 0.3})"));
    CHECK(surfaces["parking"]["ponding"] == ordered_json::array());
    CHECK(surfaces["parking"]["parameters"] == ordered_json::object());
}

TEST_CASE("what does not exist is null in JSON") {
    Scenario scenario = sample::verge_and_parking(sample::two_stamped_steps());
    scenario.title.clear();
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].runoff_start_h.reset();
    ledger.surfaces[0].figures.volumetric_runoff_coefficient.reset();
    const ordered_json json = json_of(scenario, ledger);
    CHECK(json["title"].is_null());
    const ordered_json& storm = json["storms"]["storm"];
    CHECK(storm["rain"]["starts"] == "2026-03-04T23:50:00+01:00");
    CHECK(storm["surfaces"]["verge"]["runoff_start_h"].is_null());
    CHECK(storm["surfaces"]["verge"]["volumetric_runoff_coefficient"].is_null());
}

TEST_CASE("dry time appended to a storm is no part of its rain in JSON") {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    append_dry_time(scenario.storms[0].rain, 2.0);
    scenario.storms[0].continued_h = 2.0;
    const ordered_json rain =
        json_of(scenario, sample::ledger_of_both())["storms"]["storm"]["rain"];
    CHECK(rain["steps"] == 2);
    CHECK(rain["duration_h"] == 10.0 / 60.0);
    CHECK(rain["continued_h"] == 2.0);
}

TEST_CASE("the parameters of every law stand in JSON with their canonical unit") {
    const HortonCurve curve{50.0, 6.0, 4.14};
    CHECK(parameters_of(Horton{curve, 0.02}, "horton") == ordered_json::parse(R"({
        "initial_capacity_mm_per_h": 50.0, "final_capacity_mm_per_h": 6.0, "decay_per_h": 4.14,
        "follows": "infiltrated_depth", "recovery_per_h": 0.02})"));
    CHECK(parameters_of(HortonElapsed{curve}, "horton") == ordered_json::parse(R"({
        "initial_capacity_mm_per_h": 50.0, "final_capacity_mm_per_h": 6.0, "decay_per_h": 4.14,
        "follows": "elapsed_time", "recovery_per_h": null})"));
    CHECK(parameters_of(GreenAmpt{10.9, 22.0}, "green_ampt") == ordered_json::parse(R"({
        "effective_conductivity_mm_per_h": 10.9, "suction_deficit_mm": 22.0,
        "storage_limit_mm": null, "barrier_rate_mm_per_h": null})"));
    CHECK(parameters_of(GreenAmpt{10.9, 22.0, 60.0, 0.5}, "green_ampt") == ordered_json::parse(R"({
        "effective_conductivity_mm_per_h": 10.9, "suction_deficit_mm": 22.0,
        "storage_limit_mm": 60.0, "barrier_rate_mm_per_h": 0.5})"));
    CHECK(parameters_of(Philip{12.0, 4.0}, "philip") == ordered_json::parse(R"({
        "sorptivity_mm_per_sqrt_h": 12.0, "steady_term_mm_per_h": 4.0})"));
    CHECK(parameters_of(ConstantRate{7.5, 10.0}, "constant_rate") == ordered_json::parse(R"({
        "rate_mm_per_h": 7.5, "initial_loss_mm": 10.0})"));
    CHECK(parameters_of(PhiIndex{40.0}, "phi_index") == ordered_json::parse(R"({
        "observed_excess_mm": 40.0, "rate_mm_per_h": 7.5})"));
    CHECK(parameters_of(Impervious{}, "impervious") == ordered_json::object());
}

TEST_CASE("a curve number in JSON states what it was converted to, and after whom") {
    CHECK(parameters_of(CurveNumber{80.0, 0.25}, "curve_number") == ordered_json::parse(R"({
        "number": 80.0, "antecedent": "II", "number_used": 80.0, "initial_abstraction_ratio": 0.25,
        "tabulated_ratio": null, "retention_mm": 63.5, "initial_abstraction_mm": 15.875,
        "source": null})"));
    const ordered_json wet = parameters_of(
        CurveNumber{80.0, 0.2, std::nullopt, AntecedentCondition::III}, "curve_number");
    CHECK(wet["number"] == 80.0);
    CHECK(wet["antecedent"] == "III");
    CHECK(wet["number_used"] == 91.0);  // NEH Part 630, chapter 10, table 10-1, from memory
    CHECK(wet["source"] == "NEH Part 630, chapter 10, table 10-1, linear between rows");
    const ordered_json ratio = parameters_of(CurveNumber{80.0, 0.05, 0.2}, "curve_number");
    CHECK(ratio["tabulated_ratio"] == 0.2);
    // S = 2.5 in becomes 1.33 2.5^1.15 = 3.8146 in, and 1000/(10 + 3.8146) = 72.39.
    CHECK_THAT(ratio["number_used"].get<double>(), WithinAbs(72.39, 0.005));
    CHECK_THAT(ratio["source"].get<std::string>(), Contains("Hawkins"));
}

}  // namespace rainledger
