#include "rainledger/scenario/scenario.hpp"

#include <string>
#include <variant>
#include <vector>

#include "folder.hpp"
#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

Scenario must_read(const std::string& yaml) {
    Outcome outcome = read_text_of_test(yaml);
    INFO(yaml << outcome.problems);
    REQUIRE(outcome.scenario);
    return *std::move(outcome.scenario);
}

Surface surface_with(const std::string& losses) {
    return must_read(with_losses(losses)).site.surfaces.at(0);
}

Storm storm_of(const std::string& storm) {
    return must_read(with_storm(storm)).storms.at(0);
}

using testing::Folder;

}  // namespace

TEST_CASE("a scenario is read whole") {
    const Scenario scenario = must_read(R"(title: Tannery Lane car park
storm:
  steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}
surfaces:
  verge:
    area: 1600 m2
    drains_to: CB-2
    interception: 1 mm
    depression_storage: 4 mm
    ponded_water: held
    losses:
      constant_rate: {rate: 7.5 mm/h}
  parking:
    area: 0.48 ha
    losses: impervious
    runs_onto: {verge: 30 %}
)");
    CHECK(scenario.title == "Tannery Lane car park");
    REQUIRE(scenario.storms.size() == 1);
    CHECK(scenario.storms[0].name == "storm");
    CHECK(scenario.storms[0].file.empty());
    REQUIRE(scenario.site.surfaces.size() == 2);
    const Surface& verge = scenario.site.surfaces[0];
    CHECK(verge.name == "verge");
    CHECK(verge.area_m2 == 1600.0);
    CHECK(verge.drains_to == "CB-2");
    CHECK(verge.interception_mm == 1.0);
    CHECK(verge.depression_storage_mm == 4.0);
    CHECK(verge.ponded_water == PondedWater::held);
    CHECK(verge.runs_onto.empty());
    const Surface& parking = scenario.site.surfaces[1];
    CHECK(parking.area_m2 == 4800.0);
    CHECK(parking.drains_to == "outlet");
    CHECK(parking.interception_mm == 0.0);
    CHECK(parking.depression_storage_mm == 0.0);
    CHECK(parking.ponded_water == PondedWater::infiltrates);
    CHECK(std::holds_alternative<Impervious>(parking.losses));
    REQUIRE(parking.runs_onto.size() == 1);
    CHECK(parking.runs_onto[0].surface == 0);
    CHECK(parking.runs_onto[0].share == 0.3);
    REQUIRE(scenario.places.size() == 2);
    CHECK(scenario.places[1].surface.line == 13);
    CHECK(scenario.places[1].observed_excess.line == 0);
}

TEST_CASE("a title written as a block ends with its text") {
    CHECK(must_read("title: |\n  Tannery Lane\n" + with_losses("impervious")).title ==
          "Tannery Lane");
}

TEST_CASE("without a title the file's name stands for it") {
    CHECK(must_read(with_losses("impervious")).title == "lane.yaml");
}

TEST_CASE("every law is read field by field") {
    const auto horton = std::get<Horton>(
        surface_with("{horton: {initial_capacity: 2 in/h, final_capacity: 6 mm/h, decay: 0.069 "
                     "1/min, recovery: 0.02 1/h}}")
            .losses);
    CHECK(horton.curve.initial_capacity_mm_per_h == 50.8);
    CHECK(horton.curve.final_capacity_mm_per_h == 6.0);
    CHECK_THAT(horton.curve.decay_per_h, WithinRel(4.14, 1e-15));
    CHECK(horton.recovery_per_h == 0.02);

    const auto elapsed = std::get<HortonElapsed>(
        surface_with("{horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 "
                     "1/h, follows: elapsed_time}}")
            .losses);
    CHECK(elapsed.curve.decay_per_h == 4.14);

    const auto pair = std::get<GreenAmpt>(
        surface_with("{green_ampt: {effective_conductivity: 10 mm/h, wetting_front_suction: 11 cm, "
                     "moisture_deficit: 0.2}}")
            .losses);
    CHECK(pair.conductivity_mm_per_h == 10.0);
    CHECK(pair.suction_deficit_mm == 110.0 * 0.2);
    CHECK_FALSE(pair.storage_limit_mm);
    CHECK(pair.barrier_rate_mm_per_h == 0.0);

    const auto product = std::get<GreenAmpt>(
        surface_with("{green_ampt: {effective_conductivity: 10 mm/h, suction_deficit: 42 mm, "
                     "storage_limit: 60 mm, barrier_rate: 0.5 mm/h}}")
            .losses);
    CHECK(product.suction_deficit_mm == 42.0);
    CHECK(product.storage_limit_mm == 60.0);
    CHECK(product.barrier_rate_mm_per_h == 0.5);

    const auto philip = std::get<Philip>(
        surface_with("{philip: {sorptivity: 12 mm/h^0.5, steady_term: 4 mm/h}}").losses);
    CHECK(philip.sorptivity_mm_per_sqrt_h == 12.0);
    CHECK(philip.steady_term_mm_per_h == 4.0);

    const auto rate = std::get<ConstantRate>(
        surface_with("{constant_rate: {rate: 7.5 mm/h, initial_loss: 10 mm}}").losses);
    CHECK(rate.rate_mm_per_h == 7.5);
    CHECK(rate.initial_loss_mm == 10.0);

    const Scenario phi = must_read(with_losses("{phi_index: {observed_excess: 4 mm}}"));
    CHECK(std::get<PhiIndex>(phi.site.surfaces[0].losses).observed_excess_mm == 4.0);
    CHECK(phi.places[0].observed_excess.line == 5);
    CHECK(phi.places[0].observed_excess.column == 43);

    const auto number = std::get<CurveNumber>(surface_with("{curve_number: {number: 89}}").losses);
    CHECK(number.number == 89.0);
    CHECK(number.initial_abstraction_ratio == 0.2);
    CHECK_FALSE(number.tabulated_ratio);
    CHECK(number.antecedent == AntecedentCondition::II);

    const auto converted = std::get<CurveNumber>(
        surface_with("{curve_number: {number: 100, initial_abstraction_ratio: 0.05, "
                     "tabulated_ratio: 0.2, antecedent: III}}")
            .losses);
    CHECK(converted.number == 100.0);
    CHECK(converted.initial_abstraction_ratio == 0.05);
    CHECK(converted.tabulated_ratio == 0.2);
    CHECK(converted.antecedent == AntecedentCondition::III);
}

TEST_CASE("zero is a valid parameter") {
    CHECK(read_text_of_test(with_losses("{horton: {initial_capacity: 0 mm/h, final_capacity: 0 "
                                        "mm/h, decay: 0 1/h, recovery: 0 1/h}}"))
              .scenario);
    CHECK(read_text_of_test(with_losses("{green_ampt: {effective_conductivity: 0 mm/h, "
                                        "wetting_front_suction: 0 mm, moisture_deficit: 0}}"))
              .problems.empty());
    CHECK(read_text_of_test(with_losses("{phi_index: {observed_excess: 0 mm}}")).problems.empty());
    CHECK(
        storm_of("{multiply_by: 0, steps: {every: 1 h, depths: [0, 3], unit: mm}}").rain.depth_mm ==
        std::vector<double>{0.0, 0.0});
}

TEST_CASE("equal steps keep the unit they were given in, and equal durations") {
    const Storm storm = storm_of("{steps: {every: 0.1 h, depths: [1, 2, 3, 4], unit: cm}}");
    CHECK(storm.rain.depth_mm == std::vector<double>{10.0, 20.0, 30.0, 40.0});
    CHECK(storm.rain.duration_h == std::vector<double>(4, 0.1));
    CHECK(storm.rain.own_steps == 4);
    REQUIRE(storm.rain.given);
    CHECK(storm.rain.given->unit == "h");
    CHECK(storm.rain.given->value.back() == 0.4);
    const Storm minutes = storm_of("{steps: {every: 5min, depths: [1, 2], unit: mm}}");
    CHECK(minutes.rain.given->unit == "min");
    CHECK(minutes.rain.given->value == std::vector<double>{0.0, 5.0, 10.0});
    CHECK(minutes.rain.duration_h == std::vector<double>(2, 5.0 / 60.0));
}

TEST_CASE("intensities are depths over their own steps") {
    const Storm storm =
        storm_of("{steps: {ends: [6 min, 15 min, 30 min], intensities: [10, 20, 1], unit: mm/h}}");
    REQUIRE(storm.rain.steps() == 3);
    CHECK_THAT(storm.rain.depth_mm[0], WithinRel(1.0, 1e-15));
    CHECK_THAT(storm.rain.depth_mm[1], WithinRel(3.0, 1e-15));
    CHECK_THAT(storm.rain.depth_mm[2], WithinRel(0.25, 1e-15));
    CHECK(storm.rain.given->value == std::vector<double>{0.0, 6.0, 15.0, 30.0});
}

TEST_CASE("ends in several units are kept in hours") {
    const Storm storm = storm_of("{steps: {ends: [30 min, 2 h], depths: [1, 2], unit: mm}}");
    CHECK(storm.rain.given->unit == "h");
    CHECK(storm.rain.edges_h == std::vector<double>{0.0, 0.5, 2.0});
}

TEST_CASE("an allowance scales depths and dry time follows the storm") {
    const Storm storm = storm_of(
        "{multiply_by: 1.5, continue_for: 25 min, steps: {every: 10 min, depths: [1, 2], unit: "
        "mm}}");
    CHECK(storm.multiply_by == 1.5);
    CHECK_THAT(storm.continued_h, WithinRel(25.0 / 60.0, 1e-15));
    CHECK(storm.rain.own_steps == 2);
    CHECK(storm.rain.depth_mm == std::vector<double>{1.5, 3.0, 0.0, 0.0, 0.0});
    CHECK_THAT(storm.rain.duration_h.back(), WithinRel(5.0 / 60.0, 1e-12));
}

TEST_CASE("storms by name keep their order") {
    const Scenario scenario = must_read(R"(storms:
  winter: {steps: {every: 1 h, depths: [1], unit: mm}}
  autumn: {steps: {every: 1 h, depths: [2], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)");
    REQUIRE(scenario.storms.size() == 2);
    CHECK(scenario.storms[0].name == "winter");
    CHECK(scenario.storms[1].name == "autumn");
    CHECK(scenario.storms[1].rain.depth_mm == std::vector<double>{2.0});
}

TEST_CASE("a share of all is a name alone, and shares may sum to one by rounding") {
    const Scenario scenario = must_read(kQuietStorm + R"(surfaces:
  lot: {area: 1 ha, losses: impervious, runs_onto: verge}
  roof: {area: 1 ha, losses: impervious, runs_onto: {verge: 0.1, lot: 0.2, lawn: 0.7}}
  verge: {area: 1 ha, losses: impervious}
  lawn: {area: 1 ha, losses: impervious}
)");
    REQUIRE(scenario.site.surfaces[0].runs_onto.size() == 1);
    CHECK(scenario.site.surfaces[0].runs_onto[0].surface == 2);
    CHECK(scenario.site.surfaces[0].runs_onto[0].share == 1.0);
    CHECK(scenario.site.surfaces[1].runs_onto.size() == 3);
}

TEST_CASE("a scenario file names rain beside it") {
    const Folder folder;
    folder.write("rain.csv", "end [min],depth [mm]\n5,0.4\n10,1.1\n");
    const std::string path =
        folder.write("lane.yaml",
                     "storms:\n  plain: {hyetograph: rain.csv}\n  named: "
                     "{hyetograph: {file: rain.csv, rain: 'depth [mm]', unit: in}}\n"
                     "surfaces: {lot: {area: 1 ha, losses: impervious}}\n");
    Diagnostics diagnostics;
    const auto scenario = read_scenario(path, diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        UNSCOPED_INFO(render(diagnostic));
    REQUIRE(scenario);
    CHECK(scenario->title == "lane.yaml");
    CHECK(scenario->storms[0].file == "rain.csv");
    CHECK(scenario->storms[0].rain.depth_mm == std::vector<double>{0.4, 1.1});
    CHECK_THAT(scenario->storms[1].rain.depth_mm[1], WithinRel(1.1 * 25.4, 1e-15));
}

TEST_CASE("a wrong word about a rain file is one error, and its rows are still looked at") {
    const Folder folder;
    folder.write("rain.csv", "# gauge\ntime [min],P [mm]\n5,0.4\n10,wet\n");
    folder.write("starts.csv", "start [min],depth [mm]\n5,0.4\n10,1.1\n");
    folder.write("stamps.csv", "end,depth [mm]\n2024-03-01T10:05,0.4\n2024-03-01T10:10,1.1\n");
    const auto heads = [&](const std::string& layout) {
        const std::string path = folder.write(
            "lane.yaml", "storm: {hyetograph: {" + layout +
                             "}}\nsurfaces: {lot: {area: 1 ha, losses: impervious}}\n");
        Diagnostics diagnostics;
        CHECK_FALSE(read_scenario(path, diagnostics));
        std::string out;
        for (const Diagnostic& each : diagnostics.list())
            out += std::to_string(each.place.line) + ": " + each.message + "\n";
        return out;
    };
    CHECK(heads("file: rain.csv, rain: 'P [mm]', kind: depth, stamp: middle") ==
          "1: stamp: 'middle' is not a choice here\n4: 'wet' is not a number\n");
    CHECK(heads("file: rain.csv, rain: 'P [mm]', unit: mm, kind: total, stamp: end") ==
          "1: kind: 'total' is not a choice here\n4: 'wet' is not a number\n");
    folder.write("rain.csv", "\xEF\xBB\xBF# gauge\n , \n  \ntime [min],P [mm]\n5,0.4\n10,wet\n");
    CHECK(heads("file: rain.csv, rain: 'P [mm]', kind: depth, stamp: middle") ==
          "1: stamp: 'middle' is not a choice here\n6: 'wet' is not a number\n");
    CHECK(heads("file: rain.csv, stamp: middle") == "1: stamp: 'middle' is not a choice here\n");
    CHECK(heads("file: starts.csv, stamp: middle") == "1: stamp: 'middle' is not a choice here\n");
    CHECK(heads("file: starts.csv, kind: total") == "1: kind: 'total' is not a choice here\n");
    CHECK(heads("file: starts.csv, unit: mm, kind: intensity") ==
          "1: unit: 'mm' does not go with 'kind: intensity'\n");
    CHECK(heads("file: starts.csv, unit: inches") == "1: unit: 'inches' is not a unit here\n");
    CHECK(heads("file: stamps.csv, zone: Middle/Nowhere") ==
          "1: zone: 'Middle/Nowhere' is not in the time zone database\n");
}

TEST_CASE("errors in a rain file stand beside those of the scenario") {
    const Folder folder;
    folder.write("rain.csv", "end [min],depth [mm]\n5,wet\n10,1.1\n");
    const std::string path = folder.write(
        "lane.yaml",
        "storm: {hyetograph: rain.csv}\nsurfaces: {lot: {area: 1, losses: impervious}}\n");
    Diagnostics diagnostics;
    CHECK_FALSE(read_scenario(path, diagnostics));
    REQUIRE(diagnostics.list().size() == 2);
    CHECK(diagnostics.list()[0].place.file == path);
    CHECK(diagnostics.list()[0].place.line == 2);
    CHECK_THAT(diagnostics.list()[1].place.file, Catch::Matchers::EndsWith("rain.csv"));
    CHECK(diagnostics.list()[1].place.line == 2);
}

TEST_CASE("files that cannot be read are no errors of the input") {
    Diagnostics missing;
    CHECK_FALSE(read_scenario("no/such/lane.yaml", missing));
    REQUIRE(missing.list().size() == 1);
    CHECK(missing.list()[0].trouble == Trouble::unreadable);
    CHECK(render(missing.list()[0]) ==
          "no/such/lane.yaml: error: cannot read the scenario: No such file or directory\n");

    Diagnostics rain;
    CHECK_FALSE(
        read_scenario_text("lane.yaml", with_storm("{hyetograph: no_such_rain.csv}"), rain));
    REQUIRE(rain.list().size() == 1);
    CHECK(rain.list()[0].trouble == Trouble::unreadable);
    CHECK(rain.list()[0].place.line == 1);
}

}  // namespace rainledger
