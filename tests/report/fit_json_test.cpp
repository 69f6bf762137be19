#include <cmath>

#include <nlohmann/json.hpp>

#include "rainledger/report/fit_report.hpp"
#include "rainledger/report/version.hpp"
#include "report/fit_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using nlohmann::json;
using sample::shown_of;

json json_of(const ShownFit& shown, const std::vector<std::string>& warnings = {}) {
    const std::string text = fit_json(shown, warnings);
    CHECK(text.ends_with("}\n"));
    return json::parse(text);
}

}  // namespace

TEST_CASE("the JSON of one pit has its laws, lines and steadiness at the top and in the pit") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const json all = json_of(shown);
    CHECK(all["title"] == "Quarry Row, pit 3");
    CHECK(all["program"] == json({{"name", "rainledger"}, {"version", version()}}));
    CHECK(all["readings_file"] == "pit3.csv");
    CHECK(all["single_ring"] == false);
    CHECK(all["design_factor"] == 1.0);
    CHECK(all["pooled"].is_null());
    CHECK(all["caution"] == std::string(kFitCaution));
    REQUIRE(all["pits"].size() == 1);
    for (const char* key : {"laws", "ranking", "straight_line", "steady"})
        CHECK(all[key] == all["pits"]["pit"][key]);
}

TEST_CASE("every law has its parameters and errors under its key") {
    const json laws = json_of(shown_of({sample::good_pit()}))["laws"];
    const std::vector<std::pair<std::string, std::vector<std::string>>> keys{
        {"horton", {"initial_capacity_mm_per_h", "final_capacity_mm_per_h", "decay_per_h"}},
        {"green_ampt", {"effective_conductivity_mm_per_h", "suction_deficit_mm"}},
        {"philip", {"sorptivity_mm_per_sqrt_h", "steady_term_mm_per_h"}},
        {"kostiakov", {"coefficient_mm", "exponent"}},
        {"modified_kostiakov", {"coefficient_mm", "exponent", "steady_term_mm_per_h"}}};
    CHECK(laws.size() == keys.size());
    for (const auto& [law, parameters] : keys) {
        INFO(law);
        for (const std::string& parameter : parameters)
            for (const char* member :
                 {"value", "standard_error", "low", "high", "kind", "design_value"})
                CHECK(laws[law][parameter].contains(member));
        for (const char* member : {"rmse_mm", "r_squared", "aicc"})
            CHECK(laws[law][member].is_number());
        CHECK(laws[law]["covariance"].size() == parameters.size());
        CHECK(laws[law]["residual_mm"].size() == sample::kPitMinutes.size());
    }
}

TEST_CASE("values are those of the fit, to the last bit") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const LawFit& fit = sample::law_of(shown, FieldLaw::horton);
    const json law = json_of(shown)["laws"]["horton"];
    const json& decay = law["decay_per_h"];
    CHECK(decay["value"] == fit.parameters[2].value);
    CHECK(decay["standard_error"] == *fit.parameters[2].standard_error);
    CHECK(decay["low"] == *fit.parameters[2].low);
    CHECK(decay["high"] == *fit.parameters[2].high);
    CHECK(decay["kind"] == "fitted");
    CHECK(law["covariance"][2][0] == fit.covariance[6]);
    CHECK(law["rmse_mm"] == fit.rmse_mm);
    CHECK(law["aicc"] == *fit.aicc);
    CHECK(law["fitted_to"] == "cumulative_depths");
    CHECK(law["fitted_depth_mm"][11] == fit.readings[11].fitted_depth_mm);
}

TEST_CASE("parameters on a bound, held and unlimited have null for an interval") {
    const json modified = json_of(
        shown_of({sample::good_pit()}))["laws"]["modified_kostiakov"]["steady_term_mm_per_h"];
    CHECK(modified == json({{"value", 0.0},
                            {"standard_error", nullptr},
                            {"low", nullptr},
                            {"high", nullptr},
                            {"kind", "on_bound"},
                            {"design_value", 0.0}}));
    FieldFitOptions options;
    options.steady_use = SteadyUse::fixed;
    options.fixed_rate_mm_per_h = 30.0;
    options.design_factor = 2.0;
    const json held = json_of(shown_of({sample::good_pit()}, options));
    CHECK(held["design_factor"] == 2.0);
    const json& fc = held["laws"]["horton"]["final_capacity_mm_per_h"];
    CHECK(fc["kind"] == "held");
    CHECK(fc["value"] == 30.0);
    CHECK(fc["design_value"] == 15.0);
    CHECK(fc["low"].is_null());
    const json unlimited =
        json_of(shown_of({sample::root_pit()}))["laws"]["green_ampt"]["suction_deficit_mm"];
    CHECK(unlimited["value"].is_null());
    CHECK(unlimited["kind"] == "unlimited");
}

TEST_CASE("a law that could not be fitted is null, and a warning says why") {
    const json all = json_of(shown_of({sample::dry_pit()}), {"given before"});
    CHECK(all["laws"]["philip"].is_null());
    CHECK(all["ranking"].empty());
    CHECK(all["warnings"][0] == "given before");
    CHECK(all["warnings"][3] == "Philip could not be fitted: nothing has infiltrated");
    CHECK(all["straight_line"]["interval_end"]["decay_per_h"].is_null());
    CHECK(all["straight_line"]["interval_end"]["problem"].is_string());
}

TEST_CASE("the straight line stands beside what it is less the fit") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const json lines = json_of(shown)["straight_line"];
    for (const char* place : {"interval_end", "interval_middle"}) {
        const json& line = lines[place];
        const double fitted = sample::law_of(shown, FieldLaw::horton).parameters[2].value;
        CHECK_THAT(line["less_fit"]["decay_per_h"].get<double>(),
                   WithinAbs(line["decay_per_h"].get<double>() - fitted, 1e-12));
        CHECK(line["rates_used"].get<int>() + line["rates_left_out"].get<int>() == 12);
    }
}

TEST_CASE("steadiness is told by convention, and null where nothing can be said") {
    const json steady = json_of(shown_of({sample::good_pit()}))["steady"];
    CHECK(steady["steady"] == true);
    CHECK(steady["tail_by"] == "last_three_within_tenth");
    // The last four rates: 32.0, 31.2, 30.0 and 30.4 mm/h.
    CHECK_THAT(steady["tail_mm_per_h"].get<double>(), WithinRel(30.9, 1e-12));
    const json& three = steady["conventions"]["last_three_within_tenth"];
    CHECK(three["steady"] == true);
    CHECK(three["first_reading"] == 9);
    CHECK(three["from_h"] == 1.0);
    CHECK(three["readings"] == 4);
    CHECK(steady["conventions"]["less_than_tenth_in_an_hour"]["steady"] == false);
    CHECK(steady["final_capacity_without_end"]["readings_left_out"] == 3);
    const json early = json_of(shown_of({sample::short_pit()}))["steady"];
    CHECK(early["steady"] == false);
    CHECK(early["conventions"]["less_than_tenth_in_an_hour"]["steady"].is_null());
}

TEST_CASE("several pits stand under their names, and what they have in common under pooled") {
    const ShownFit shown = sample::three_pits();
    const json all = json_of(shown);
    CHECK(!all.contains("laws"));
    CHECK(all["pits"].size() == 3);
    CHECK(all["pits"]["south"]["readings"].size() == 12);
    CHECK(all["pits"]["south"]["readings"][0] == json({{"start_h", 0.0},
                                                       {"middle_h", 2.5 / 60.0},
                                                       {"end_h", 5.0 / 60.0},
                                                       {"interval_mm", 12.2},
                                                       {"depth_mm", 12.2},
                                                       {"rate_mm_per_h", 12.2 / (5.0 / 60.0)}}));
    const json& pooled = all["pooled"];
    CHECK(pooled["laws"]["horton"]["residual_mm"].size() == 36);
    CHECK(pooled["warnings"][0]["caution"] == "pits_differ");
    const json& spread = pooled["spread"][0];
    CHECK(spread["law"] == "horton");
    CHECK(spread["parameter"] == "initial_capacity_mm_per_h");
    REQUIRE(spread["values"].size() == 3);
    const double a = spread["values"][0];
    const double b = spread["values"][1];
    const double c = spread["values"][2];
    CHECK_THAT(spread["mean"].get<double>(), WithinRel((a + b + c) / 3.0, 1e-12));
    CHECK(spread["smallest"] == b);
    CHECK(spread["largest"] == c);
    const bool told = std::ranges::any_of(all["warnings"], [](const json& warning) {
        return warning.get<std::string>().starts_with("all pits: Kostiakov: the pits differ");
    });
    CHECK(told);
}

}  // namespace rainledger
