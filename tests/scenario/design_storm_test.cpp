#include <cmath>
#include <numeric>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/scenario/storm_making.hpp"
#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kInch = 25.4;
constexpr double kRounding = 1e-12;  // relative: sums of a few hundred depths

Storm storm_in(const StormRoom& room, const std::string& storm) {
    Outcome outcome = room.read("storm: {" + storm + "}\n");
    INFO(storm << "\n" << outcome.problems);
    REQUIRE(outcome.scenario);
    return outcome.scenario->storms.at(0);
}

Storm design_in(const StormRoom& room, const std::string& design) {
    return storm_in(room, "design: {" + design + "}");
}

const DesignOrigin& origin_of(const Storm& storm) {
    return std::get<DesignOrigin>(storm.origin);
}

/// The depths of a storm in inches, each within half a unit of the third decimal.
void check_inches(const Storm& storm, const std::vector<double>& inches, double room) {
    REQUIRE(storm.rain.steps() == inches.size());
    for (std::size_t i = 0; i < inches.size(); ++i) {
        INFO("step " << i + 1);
        CHECK_THAT(storm.rain.depth_mm[i] / kInch, WithinAbs(inches[i], room));
    }
}

const std::string kDenver = "formula: {a: 96.6 in/h, b: 13.9, m: 0.97, n: 1, time: min}";

}  // namespace

// Chow, Maidment and Mays, Applied Hydrology, 1988, example 14.4.2 (from memory): Denver, 10 years.
TEST_CASE("a scenario gives the published alternating blocks of two hours") {
    const StormRoom room;
    const Storm storm = design_in(
        room,
        "pattern: alternating_blocks, duration: 2 h, every: 10 min, peak_at: 0.5, " + kDenver);
    check_inches(
        storm, {0.024, 0.033, 0.050, 0.084, 0.178, 0.693, 0.308, 0.117, 0.063, 0.040, 0.028, 0.021},
        0.0005);
    CHECK_THAT(total_depth_mm(storm.rain) / kInch, WithinAbs(1.63943, 0.000005));
    CHECK(origin_of(storm).depth_words == "the formula");
    CHECK(origin_of(storm).peak_at == 0.5);
    CHECK_FALSE(origin_of(storm).peak_at_assumed);
    CHECK(origin_of(storm).held.size() == 4);  // 10 and 30 min, 1 and 2 h
}

// The instantaneous curve of Keifer and Chu, Synthetic storm pattern for drainage design, 1957,
// with Denver's constants (Wenzel 1982 in Chow and others, table 14.2.3, from memory), integrated
// over each step: derived.
TEST_CASE("a scenario gives the integrals of Keifer and Chu's curve") {
    const StormRoom room;
    const Storm storm = design_in(
        room, "pattern: keifer_chu, duration: 2 h, every: 10 min, peak_at: 0.375, " + kDenver);
    check_inches(storm,
                 {0.0239, 0.0371, 0.0680, 0.1790, 0.6827, 0.3003, 0.1336, 0.0773, 0.0511, 0.0367,
                  0.0278, 0.0220},
                 0.00005);
    CHECK(origin_of(storm).peak_at == 0.375);
    CHECK(origin_of(storm).held.empty());
}

TEST_CASE("a table of statistics gives the depth of the return period") {
    const StormRoom room;
    const std::string design =
        "pattern: alternating_blocks, duration: 2 h, every: 5 min, statistics: county.csv, "
        "return_period: ";
    const Storm storm = design_in(room, design + "10 yr");
    CHECK(storm.rain.steps() == 24);
    CHECK_THAT(total_depth_mm(storm.rain), WithinRel(48.0, kRounding));
    CHECK_THAT(storm.rain.depth_mm[11], WithinRel(12.5, kRounding));  // the step that ends at half
    CHECK(storm.file == "county.csv");
    CHECK(storm.files == std::vector<std::string>{room.path("county.csv")});
    const DesignOrigin& origin = origin_of(storm);
    CHECK(origin.pattern == StormPattern::alternating_blocks);
    CHECK(origin.duration_h == 2.0);
    CHECK(origin.every_h == 5.0 / 60.0);
    CHECK(origin.peak_at == 0.5);
    CHECK(origin.peak_at_assumed);
    CHECK(origin.return_period_yr == 10.0);
    CHECK(origin.depth_words == "county.csv");
    REQUIRE(origin.held.size() == 3);
    CHECK_THAT(origin.held[1].storm_mm, WithinRel(41.0, kRounding));

    // Gumbel's reduced variate of 25 years lies between those of 10 and 100.
    const auto variate = [](double years) { return -std::log(-std::log(1.0 - 1.0 / years)); };
    const double share = (variate(25.0) - variate(10.0)) / (variate(100.0) - variate(10.0));
    CHECK_THAT(total_depth_mm(design_in(room, design + "25 yr").rain),
               WithinRel(48.0 * std::pow(71.5 / 48.0, share), 1e-9));
}

TEST_CASE("a list of depths needs no return period, in a file or in the scenario") {
    const StormRoom room;
    const std::string uniform = "pattern: uniform, duration: 1 h, every: 15 min, ";
    const Storm file = design_in(room, uniform + "statistics: list.csv");
    CHECK_THAT(total_depth_mm(file.rain), WithinRel(32.0, kRounding));
    CHECK_FALSE(origin_of(file).return_period_yr);
    const Storm listed =
        design_in(room, uniform + "depths: {5 min: 9.8 mm, 60 min: 32 mm, 0.1 d: 4 cm}");
    CHECK_THAT(total_depth_mm(listed.rain), WithinRel(32.0, kRounding));
    CHECK(origin_of(listed).depth_words == "the listed depths");
    CHECK(listed.file.empty());
    CHECK(listed.files.empty());
    const Storm one = design_in(room, uniform + "depth: 2 in");
    CHECK_THAT(total_depth_mm(one.rain), WithinRel(2.0 * kInch, kRounding));
    CHECK(origin_of(one).depth_words == "the stated depth");
    CHECK_FALSE(origin_of(one).peak_at);
    CHECK_FALSE(origin_of(one).peak_at_assumed);
}

TEST_CASE("a triangle rises to its peak") {
    const StormRoom room;
    // P 1.639 in over 2 h with its peak at 0.4: 0.6556 in fall before it (Yen and Chow 1980;
    // derived).
    const Storm storm = design_in(
        room, "pattern: triangular, duration: 2 h, every: 6 min, peak_at: 0.4, depth: 1.639 in");
    const double before =
        std::accumulate(storm.rain.depth_mm.begin(), storm.rain.depth_mm.begin() + 8, 0.0);
    CHECK_THAT(before / kInch, WithinAbs(0.6556, 0.00005));
    CHECK(origin_of(storm).peak_at == 0.4);
}

TEST_CASE("a mass curve is a published one or the user's points") {
    const StormRoom room;
    const std::string day =
        "pattern: mass_curve, duration: 24 h, every: 12 h, depth: 100 mm, curve: ";
    const Storm published = design_in(room, day + "nrcs_II");
    CHECK_THAT(published.rain.depth_mm[0], WithinRel(66.3, kRounding));
    const std::string words = origin_of(published).curve_words;
    CHECK_THAT(words, Contains(std::string(find_mass_curve("nrcs_II")->title)));
    CHECK_THAT(words, Contains(std::string(find_mass_curve("nrcs_II")->source)));

    const std::string points = "[[0, 0], [0.25, 0.1], [0.75, 0.9], [1, 1]]";
    const Storm own = design_in(room, day + points);
    CHECK_THAT(own.rain.depth_mm[0], WithinRel(50.0, kRounding));
    CHECK(origin_of(own).curve_words == "points in the scenario");

    const std::string eight =
        "pattern: mass_curve, duration: 24 h, every: 3 h, depth: 100 mm, curve: " + points;
    const Storm linear = design_in(room, eight + ", interpolate: linear");
    const Storm smooth = design_in(room, eight + ", interpolate: smooth");
    CHECK_THAT(linear.rain.depth_mm[0], WithinRel(5.0, kRounding));
    CHECK(smooth.rain.depth_mm[0] < 4.9);
    CHECK_THAT(total_depth_mm(smooth.rain), WithinRel(100.0, kRounding));
}

TEST_CASE("rain is resampled first, then multiplied, then continued") {
    const StormRoom room;
    const Storm storm = storm_in(
        room,
        "design: {pattern: triangular, duration: 1 h, every: 5 min, depth: 30 mm}, multiply_by: "
        "1.2, continue_for: 40 min, resample: 20 min");
    CHECK(storm.rain.own_steps == 3);
    CHECK(storm.rain.steps() == 5);
    CHECK_THAT(total_depth_mm(storm.rain), WithinRel(36.0, kRounding));
    CHECK(storm.continued_h == 40.0 / 60.0);
    REQUIRE(storm.resampled);
    CHECK(storm.resampled->every_h == 20.0 / 60.0);
    // The triangle's peak is 60 mm/h; its highest five minutes hold 55/60 of that, its middle
    // twenty 30 mm (1 - 2 (20/30)^2 / 2).
    CHECK_THAT(storm.resampled->peak_before_mm_per_h, WithinRel(55.0, 1e-9));
    CHECK_THAT(storm.resampled->peak_after_mm_per_h, WithinRel(50.0, 1e-9));
    CHECK_THAT(peak_intensity_mm_per_h(storm.rain), WithinRel(60.0, 1e-9));
}

TEST_CASE("steps and hyetographs are resampled too, within bounds") {
    const StormRoom room;
    const Storm storm =
        storm_in(room, "steps: {every: 5 min, depths: [1, 2, 3, 4], unit: mm}, resample: 10 min");
    CHECK(storm.rain.depth_mm == std::vector<double>{3.0, 7.0});
    CHECK(std::holds_alternative<std::monostate>(storm.origin));
    CHECK(
        room.problems("storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 0.01 s}\n") ==
        R"(lane.yaml:1:64: error: resample: 0.01 s would cut the storm into more than a million steps
    storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 0.01 s}
                                                                   ^
    lengthen it; rain says nothing between its own steps
)");
    CHECK(room.problems("storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 1 d}\n") ==
          R"(lane.yaml:1:64: error: resample: 1 d is longer than the storm, 10 h
    storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 1 d}
                                                                   ^
    its rain would be spread over time in which none fell: shorten it
)");
    CHECK(room.problems("storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 15}\n") ==
          R"(lane.yaml:1:64: error: resample: '15' has no unit
    storm: {steps: {every: 10 h, depths: [1], unit: mm}, resample: 15}
                                                                   ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
)");
}

TEST_CASE("a design is made without a scenario, or it is said why not") {
    DesignWish wish;
    wish.pattern = StormPattern::uniform;
    wish.duration_h = 1.0;
    wish.every_h = 0.25;
    wish.depth = 30.0;
    const MadeStorm made = storm_of_design(wish);
    REQUIRE(made.storm);
    CHECK(made.problem.empty());
    CHECK(made.storm->name == "storm");
    CHECK(made.storm->rain.depth_mm == std::vector<double>(4, 7.5));

    wish.return_period_yr = 10.0;
    CHECK_FALSE(storm_of_design(wish).storm);
    CHECK(storm_of_design(wish).problem ==
          "a return period picks a column of rainfall statistics, and there are none");
    wish.return_period_yr.reset();
    wish.every_h = 2.0;
    CHECK_FALSE(storm_of_design(wish).storm);
    CHECK(storm_of_design(wish).problem == "the step of 2 h is longer than the storm of 1 h");
}

TEST_CASE("surfaces may be left out where they are not needed, and are read where they stand") {
    const StormRoom room;
    const std::string storm = "storm: {steps: {every: 1 h, depths: [1, 2, 9], unit: mm}}\n";
    CHECK(room.problems(storm).empty());
    CHECK(problems(storm) ==
          R"(lane.yaml:1:1: error: the scenario has no surfaces
    storm: {steps: {every: 1 h, depths: [1, 2, 9], unit: mm}}
    ^
    write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: impervious}'
)");
    const Outcome with = room.read(storm + "surfaces: {lot: {area: 1 ha, losses: impervious}}\n");
    REQUIRE(with.scenario);
    CHECK(with.scenario->site.surfaces.size() == 1);
    CHECK(room.problems(storm + "surfaces: {lot: {losses: impervious}}\n") ==
          R"(lane.yaml:2:12: error: 'area' is missing from surface 'lot'
    surfaces: {lot: {losses: impervious}}
               ^
    add 'area: 0.42 ha'
)");
}

}  // namespace rainledger
