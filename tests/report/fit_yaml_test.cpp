#include <yaml-cpp/yaml.h>

#include "rainledger/report/fit_report.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "report/fit_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using sample::halved;
using sample::shown_of;

std::string yaml_of(const ShownFit& shown, std::optional<FieldLaw> law = {}) {
    std::string problem;
    const auto yaml = fit_yaml(shown, law, problem);
    INFO(problem);
    REQUIRE(yaml);
    CHECK(problem.empty());
    return *yaml;
}

std::string problem_of(const ShownFit& shown, std::optional<FieldLaw> law = {}) {
    std::string problem;
    CHECK(!fit_yaml(shown, law, problem));
    return problem;
}

/// The block as it stands, under a surface of a scenario that the program reads.
Losses losses_in_scenario(const std::string& yaml) {
    const std::size_t from = yaml.find("losses:\n");
    REQUIRE(from != std::string::npos);
    std::string block = "    " + yaml.substr(from, yaml.find("\n\n", from) - from) + "\n";
    for (std::size_t at = block.find('\n'); at + 1 < block.size(); at = block.find('\n', at + 5))
        block.insert(at + 1, "    ");
    Diagnostics diagnostics;
    const auto scenario = read_scenario_text("scenario.yaml",
                                             "storm:\n  steps: {every: 5 min, depths: [1], unit: "
                                             "mm}\nsurfaces:\n  swale:\n    area: 100 "
                                             "m2\n" +
                                                 block,
                                             diagnostics);
    INFO(block);
    REQUIRE(scenario);
    CHECK(diagnostics.list().empty());
    return scenario->site.surfaces.front().losses;
}

}  // namespace

TEST_CASE("the YAML of readings that follow Horton's curve, in full up to the draws") {
    const std::string yaml = yaml_of(shown_of({sample::horton_pit({100.0, 30.0, 4.0})}));
    CHECK(yaml.substr(0, yaml.find("\n\n")) ==
          R"(# Infiltration from a field test, for a surface of a scenario.
# Quarry Row, pit 3
# Horton, fitted to 12 readings of pit3.csv; RMSE 0.00 mm, R2 1.0000
# A field test describes a small area under ponded water; local codes and a licensed engineer
# decide.
losses:
  horton:
    initial_capacity: 100 mm/h  # 95 % interval 100 to 100
    final_capacity: 30 mm/h  # 95 % interval 30 to 30
    decay: 4 1/h  # 95 % interval 4 to 4)");
}

TEST_CASE("a scenario takes the block of each law unchanged, with the fitted values") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const auto value = [&](FieldLaw law, std::size_t i) {
        return WithinRel(sample::law_of(shown, law).parameters[i].value, 1e-6);
    };
    const auto horton = std::get<Horton>(losses_in_scenario(yaml_of(shown)));
    CHECK_THAT(horton.curve.initial_capacity_mm_per_h, value(FieldLaw::horton, 0));
    CHECK_THAT(horton.curve.final_capacity_mm_per_h, value(FieldLaw::horton, 1));
    CHECK_THAT(horton.curve.decay_per_h, value(FieldLaw::horton, 2));
    const auto green_ampt =
        std::get<GreenAmpt>(losses_in_scenario(yaml_of(shown, FieldLaw::green_ampt)));
    CHECK_THAT(green_ampt.conductivity_mm_per_h, value(FieldLaw::green_ampt, 0));
    CHECK_THAT(green_ampt.suction_deficit_mm, value(FieldLaw::green_ampt, 1));
    const auto philip = std::get<Philip>(losses_in_scenario(yaml_of(shown, FieldLaw::philip)));
    CHECK_THAT(philip.sorptivity_mm_per_sqrt_h, value(FieldLaw::philip, 0));
    CHECK_THAT(philip.steady_term_mm_per_h, value(FieldLaw::philip, 1));
}

TEST_CASE("the draws carry the means and the covariance of the block") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const LawFit& fit = sample::law_of(shown, FieldLaw::horton);
    const YAML::Node draws = YAML::Load(yaml_of(shown))["draws"];
    CHECK(draws["law"].Scalar() == "horton");
    REQUIRE(draws["names"].size() == 3);
    CHECK(draws["degrees_of_freedom"].as<int>() == 9);
    for (std::size_t row = 0; row < 3; ++row) {
        CHECK(draws["names"][row].Scalar() == fit.parameters[row].key);
        CHECK(draws["means"][row].as<double>() == fit.parameters[row].value);
        for (std::size_t column = 0; column < 3; ++column)
            CHECK(draws["covariance"][row][column].as<double>() ==
                  fit.covariance[row * 3 + column]);
    }
}

TEST_CASE("a design factor divides the rates of the block and of the draws, and says so") {
    const ShownFit shown = shown_of({sample::good_pit()}, halved());
    const LawFit& fit = sample::law_of(shown, FieldLaw::horton);
    const std::string yaml = yaml_of(shown);
    CHECK_THAT(yaml, Contains("# rates divided by 2 for design, as asked; as fitted: initial "
                              "capacity 115.9"));
    const auto horton = std::get<Horton>(losses_in_scenario(yaml));
    CHECK_THAT(horton.curve.initial_capacity_mm_per_h,
               WithinRel(fit.parameters[0].value / 2.0, 1e-6));
    CHECK_THAT(horton.curve.decay_per_h, WithinRel(fit.parameters[2].value, 1e-6));
    const YAML::Node draws = YAML::Load(yaml)["draws"];
    CHECK(draws["means"][0].as<double>() == fit.parameters[0].value / 2.0);
    const auto entry = [&](std::size_t row, std::size_t column) {
        return draws["covariance"][row][column].as<double>();
    };
    CHECK_THAT(entry(0, 1), WithinRel(fit.covariance[1] / 4.0, 1e-12));
    CHECK_THAT(entry(0, 2), WithinRel(fit.covariance[2] / 2.0, 1e-12));
    CHECK_THAT(entry(2, 2), WithinRel(fit.covariance[8], 1e-12));
}

TEST_CASE("a law that scenarios do not know gives way to the next, and a comment says so") {
    const std::string yaml = yaml_of(shown_of({sample::short_pit()}));
    CHECK_THAT(yaml, Contains("# Kostiakov ranks before this law, but scenarios do not know it (it "
                              "is for comparison)\n"));
    CHECK_THAT(yaml, Contains("# warning: the test stopped too early: "));
    CHECK(std::holds_alternative<Philip>(losses_in_scenario(yaml)));
}

TEST_CASE("an unlimited suction gives way too") {
    FieldFitOptions options;
    options.laws = {FieldLaw::green_ampt, FieldLaw::philip};
    const ShownFit shown = shown_of({sample::root_pit()}, options);
    REQUIRE(shown.fit.pits.front().ranking.front().law == FieldLaw::green_ampt);
    const std::string yaml = yaml_of(shown);
    CHECK_THAT(yaml, Contains("# Green-Ampt ranks before this law, but its conductivity is 0"));
    const auto philip = std::get<Philip>(losses_in_scenario(yaml));
    CHECK_THAT(philip.sorptivity_mm_per_sqrt_h, WithinRel(20.0, 1e-6));
    CHECK(philip.steady_term_mm_per_h == 0.0);
    CHECK_THAT(yaml, Contains("    steady_term: 0 mm/h  # on its bound\n"));
}

TEST_CASE("a law asked for says what ranks before it") {
    CHECK_THAT(yaml_of(shown_of({sample::good_pit()}), FieldLaw::philip),
               Contains("# Horton ranks before this law, but Philip was asked for\n"));
}

TEST_CASE("pits are taken together, with their spread in a comment") {
    const std::string yaml = yaml_of(sample::three_pits(), FieldLaw::horton);
    CHECK_THAT(yaml, Contains("# Horton, fitted to 36 readings of swale.csv, 3 pits together; "));
    CHECK_THAT(yaml, Contains("# ranked first in the pits, each fitted alone: Horton in 3 of 3\n"));
    CHECK_THAT(yaml, Contains("# between the pits, as fitted: initial capacity 75.0 to 157 mm/h"));
    CHECK_THAT(yaml, Contains("# They are those of the fit to all pits and narrower than the "
                              "site.\ndraws:\n"));
}

TEST_CASE("without errors of the parameters there are no draws") {
    FieldFitOptions options;
    options.laws = {FieldLaw::philip};
    const auto test = test_of(ReadingKind::infiltrated, {15, 60}, {12.5, 30.0});
    const std::string yaml = yaml_of(shown_of({test}, options));
    CHECK_THAT(yaml, Contains("# no draws: the readings leave nothing from which the parameters' "
                              "errors can be told"));
    CHECK_THAT(yaml, !Contains("\ndraws:"));
    CHECK(std::holds_alternative<Philip>(losses_in_scenario(yaml)));
}

TEST_CASE("what cannot be written says why") {
    const ShownFit good = shown_of({sample::good_pit()});
    CHECK(problem_of(good, FieldLaw::kostiakov) ==
          "Kostiakov: scenarios do not know it (it is for comparison)");
    FieldFitOptions options;
    options.laws = {FieldLaw::kostiakov};
    const ShownFit kostiakov = shown_of({sample::good_pit()}, options);
    CHECK(problem_of(kostiakov) ==
          "no law that scenarios can hold (Horton, Green-Ampt, Philip) was fitted");
    CHECK(problem_of(kostiakov, FieldLaw::philip) == "Philip is not among the laws fitted");
    CHECK(problem_of(shown_of({sample::dry_pit()}), FieldLaw::philip) ==
          "Philip could not be fitted: nothing has infiltrated");
    CHECK(problem_of(shown_of({sample::root_pit()}), FieldLaw::green_ampt) ==
          "Green-Ampt: its conductivity is 0 and its suction-deficit product unlimited, which no "
          "scenario can hold");
}

TEST_CASE("titles cannot leave their comment") {
    ShownFit shown = shown_of({sample::good_pit()});
    shown.title = "x\nlosses: impervious\n";
    shown.readings = "a\nb: c";
    const std::string yaml = yaml_of(shown);
    CHECK_THAT(yaml, Contains("# x?losses: impervious?\n"));
    CHECK(YAML::Load(yaml).size() == 2);
}

TEST_CASE("the same fit gives the same YAML") {
    CHECK(yaml_of(sample::three_pits()) == yaml_of(sample::three_pits()));
}

}  // namespace rainledger
