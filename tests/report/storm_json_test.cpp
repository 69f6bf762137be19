#include "rainledger/report/storm_json.hpp"

#include <nlohmann/json.hpp>

#include "rainledger/report/caution.hpp"
#include "rainledger/report/json.hpp"
#include "report/storm_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using nlohmann::ordered_json;

ordered_json json_of(const Storm& storm) {
    Scenario scenario;
    scenario.storms = {storm};
    return ordered_json::parse(storm_json(scenario, {}));
}

}  // namespace

TEST_CASE("the JSON of a design storm has its rain, peaks and steps") {
    const std::vector<std::string> warnings{"take care"};
    Scenario scenario;
    scenario.title = "Tannery Lane";
    scenario.storms = {sample::design_storm()};
    const ordered_json json = ordered_json::parse(storm_json(scenario, warnings));
    CHECK(json["title"] == "Tannery Lane");
    CHECK(json["program"]["name"] == "rainledger");
    CHECK(json["warnings"] == ordered_json{"take care"});
    CHECK(json["caution"] == kRainCaution);
    const ordered_json& storm = json["storms"]["storm"];
    CHECK(storm["rain"]["depth_mm"] == 21.0);
    CHECK(storm["rain"]["file"] == "county_rain.csv");
    CHECK(storm["rain"]["design"] == ordered_json::parse(R"({
        "pattern": "alternating_blocks", "duration_h": 0.25, "every_h": 0.08333333333333333,
        "peak_at": 0.5, "peak_at_assumed": true, "return_period_yr": 10.0,
        "depth_from": "county_rain.csv", "curve": null, "held": [
          {"duration_h": 0.08333333333333333, "statistic_mm": 12.5, "storm_mm": 12.5},
          {"duration_h": 0.16666666666666666, "statistic_mm": 19.0, "storm_mm": 19.0},
          {"duration_h": 0.25, "statistic_mm": 21.0, "storm_mm": 21.0}]})"));
    CHECK_FALSE(storm["rain"].contains("event"));
    CHECK_FALSE(storm["rain"].contains("resampled"));
    CHECK(storm["peaks"]["5"] ==
          ordered_json::parse(R"({"depth_mm": 12.5, "intensity_mm_per_h": 150.0})"));
    CHECK(storm["peaks"]["60"]["depth_mm"] == 21.0);
    CHECK(storm["steps"][1] == ordered_json::parse(R"({"start_h": 0.08333333333333333,
        "end_h": 0.16666666666666666, "depth_mm": 12.5})"));
    CHECK(storm["steps"].size() == 3);
}

TEST_CASE("the JSON of an event has its peaks, antecedent rain, rarity and stamps") {
    Storm sampled = sample::event_storm();
    sampled.resampled = ResampledFrom{0.25, 150.0, 84.0};
    const ordered_json storm = json_of(sampled)["storms"]["2026-03-04 23:50"];
    CHECK(storm["rain"]["starts"] == "2026-03-04T23:50:00+01:00");
    const ordered_json& event = storm["rain"]["event"];
    CHECK(event["number"] == 2);
    CHECK(event["events_in_record"] == 7);
    CHECK(event["peaks_mm"]["1440"] == 21.0);
    CHECK(event["antecedent_5_day_mm"] == 10.25);
    CHECK(event["antecedent_known"] == true);
    CHECK(event["without_data_h"] == 0.5);
    CHECK(event["rarity"]["by_duration"][1] == ordered_json::parse(R"({
        "duration_h": 0.16666666666666666, "depth_mm": 29.0, "return_period_yr": null,
        "more_than_yr": 100.0, "less_than_yr": null})"));
    CHECK(event["rarity"]["rarest_duration_h"] == 10.0 / 60.0);
    CHECK(storm["rain"]["resampled"] == ordered_json::parse(R"({"every_h": 0.25,
        "peak_before_mm_per_h": 150.0, "peak_after_mm_per_h": 84.0})"));
    CHECK(storm["steps"][0]["start"] == "2026-03-04T23:50:00+01:00");
}

TEST_CASE("rain between two instants has no number, and an event without statistics no rarity") {
    Storm sampled = sample::event_storm();
    auto& origin = std::get<EventOrigin>(sampled.origin);
    origin.event.number = 0;
    origin.rarity.reset();
    const ordered_json event = json_of(sampled)["storms"]["2026-03-04 23:50"]["rain"]["event"];
    CHECK(event["number"].is_null());
    CHECK(event["events_in_record"].is_null());
    CHECK(event["rarity"].is_null());
}

TEST_CASE("the JSON of losses tells where a storm comes from, and nothing of rain as given") {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    const std::vector<SiteLedger> ledgers(1, sample::ledger_of_both());
    const auto rain_of = [&] {
        return ordered_json::parse(results_json(scenario, ledgers, {}))["storms"].front()["rain"];
    };
    CHECK_FALSE(rain_of().contains("design"));
    scenario.storms = {sample::design_storm()};
    CHECK(rain_of()["design"]["return_period_yr"] == 10.0);
    scenario.storms = {sample::event_storm()};
    CHECK(rain_of()["event"]["events_in_record"] == 7);
}

TEST_CASE("the JSON of a table has its depths and the formulas with their residuals") {
    RainfallStatistics table;
    table.duration_h = {0.25, 1.0};
    table.return_period_yr = {2.0, 10.0};
    table.depth_mm = {15.5, 23.5, 27.1, 41.0};
    table.set_aside = {"upper limits"};
    const IntensityFormula formula{2453.64, 13.9, 0.97, 1.0, 1.0 / 60.0};
    const std::vector<ColumnFit> fits{
        {10.0,
         {{0.25, 1.0}, {23.5, 41.0}},
         {{FormulaFit{FormulaForm::free_m, formula, {-0.0125, 0.02}, 0.0125}, {}},
          {std::nullopt, "too few depths"}}}};
    const ordered_json json = ordered_json::parse(statistics_json("county", table, fits, {}));
    CHECK(json["title"] == "county");
    CHECK(json["statistics"] == ordered_json::parse(R"({"duration_h": [0.25, 1.0],
        "return_period_yr": [2.0, 10.0], "depth_mm": [[15.5, 23.5], [27.1, 41.0]],
        "set_aside": ["upper limits"]})"));
    CHECK(json["formulas"] == ordered_json::parse(R"([{"return_period_yr": 10.0, "fits": [
        {"free": "m", "a_mm_per_h": 2453.64, "b": 13.9, "m": 0.97, "n": 1.0,
         "time_unit_h": 0.016666666666666666, "residual": [-0.0125, 0.02],
         "rms_log_residual": 0.0125, "problem": null},
        {"problem": "too few depths"}]}])"));
}

TEST_CASE("the JSON of a record has its notes and every event, by time") {
    GaugeRecord record = sample::tip_record();
    record.notes.same_instant = 4;
    const std::vector<EventRarity> rarities(2, sample::rarity());
    const ordered_json json = ordered_json::parse(
        events_json("Events", record, {3.0, 0.5}, sample::two_events(), rarities, {}));
    CHECK(json["record"]["file"] == "logger.csv");
    CHECK(json["record"]["kind"] == "tips");
    CHECK(json["record"]["tip_mm"] == 0.25);
    CHECK(json["record"]["starts"] == "2031-06-14T12:01:47+02:00");
    CHECK(json["record"]["notes"]["same_instant"] == 4);
    CHECK(json["rule"] == ordered_json::parse(R"({"dry_spell_h": 3.0, "threshold_mm": 0.5})"));
    CHECK(json["outside_mm"] == 0.75);
    REQUIRE(json["events"].size() == 2);
    const ordered_json& second = json["events"][1];
    CHECK(second["number"] == 2);
    CHECK(second["starts"] == "2031-06-14T21:30:00+02:00");
    CHECK(second["ends"] == "2031-06-15T02:45:00+02:00");
    CHECK(second["duration_h"] == 5.25);
    CHECK(second["peaks_mm"]["15"] == 4.0);
    CHECK(second["rarity"]["rarest_duration_h"] == 10.0 / 60.0);
}

TEST_CASE("a record of elapsed times has hours in place of stamps in JSON") {
    GaugeRecord record;
    record.rain = make_hyetograph({0.0, 60.0, 1440.0}, "min", {21.0, 0.0});
    RecordEvents events = sample::two_events();
    events.events.resize(1);
    events.events[0].from_ms = 0;
    events.events[0].to_ms = sample::kHourMs;
    const ordered_json json = ordered_json::parse(events_json("", record, {}, events, {}, {}));
    CHECK(json["title"].is_null());
    CHECK(json["record"]["kind"] == "intervals");
    CHECK(json["record"]["tip_mm"].is_null());
    CHECK(json["record"]["ends"].is_null());
    CHECK(json["record"]["ends_h"] == 24.0);
    CHECK(json["events"][0]["starts"].is_null());
    CHECK(json["events"][0]["ends_h"] == 1.0);
    CHECK(json["events"][0]["rarity"].is_null());
}

}  // namespace rainledger
