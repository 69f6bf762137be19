#include <string>

#include "chart/loss_view.hpp"
#include "chart/scenes.hpp"
#include "test.hpp"

using namespace rainledger;

namespace {

std::string names(const ChosenLosses& losses) {
    std::string out;
    for (const LossView& view : losses.views)
        out += "[" + view.name + "]";
    return out + " " + losses.about;
}

Scenario several() {
    return scenes::scenario_of("Millbrook depot",
                               {scenes::storm_of("2 years", scenes::half_an_hour()),
                                scenes::storm_of("10 years", scenes::uneven())},
                               {scenes::lawn(), scenes::roof()});
}

std::string chosen(const Scenario& scenario, const ChartChoice& choice) {
    const auto ledgers = scenes::ledgers_of(scenario);
    return names(chosen_losses(scenario, ledgers, choice));
}

}  // namespace

TEST_CASE("a chart of losses shows what was chosen, or all there is") {
    CHECK(chosen(several(), {}) == "[2 years][10 years] the whole site, every storm");
    CHECK(chosen(several(), {0, {}}) == "[lawn][roof] storm 2 years, every surface");
    CHECK(chosen(several(), {{}, 0}) ==
          "[2 years][10 years] lawn, Horton by infiltrated depth, every storm");
    CHECK(chosen(several(), {1, 1}) == "[] roof, impervious, storm 10 years");
    CHECK(chosen(scenes::one_lawn(), {}) == "[] lawn, Horton by infiltrated depth");
    Scenario surfaces = several();
    surfaces.storms.pop_back();
    surfaces.storms[0].name = "storm";
    surfaces.storms[0].multiply_by = 1.2;
    CHECK(chosen(surfaces, {}) == "[lawn][roof] rain multiplied by 1.2, every surface");
}

TEST_CASE("the site's rows stand for the whole site") {
    const Scenario scenario = several();
    const auto ledgers = scenes::ledgers_of(scenario);
    const ChosenLosses losses = chosen_losses(scenario, ledgers, {});
    REQUIRE(losses.views.size() == 2);
    CHECK(losses.views[0].surface == nullptr);
    CHECK(losses.views[1].total.excess_mm == ledgers[1].site.total.excess_mm);
}

TEST_CASE("excess in words") {
    LossView view;
    const ChartUnits metric(DisplayUnits::metric);
    CHECK(excess_words(view, "coefficient", metric) == "no rain");
    view.total.excess_mm = 6.66;
    view.coefficient = 0.333;
    CHECK(excess_words(view, "coefficient", metric) == "excess 6.7 mm, coefficient 0.33");
    CHECK(excess_words(view, "share", ChartUnits(DisplayUnits::inches)) ==
          "excess 0.26 in, share 0.33");
}

TEST_CASE("elapsed-time Horton is named as such") {
    CHECK(loss_method(HortonElapsed{}) == "Horton by elapsed time");
    CHECK(loss_method(CurveNumber{72.5}) == "curve number 72.5");
}

TEST_CASE("rates of a step are its accounts over its length") {
    const Scenario scenario = scenes::one_lawn();
    const auto ledgers = scenes::ledgers_of(scenario);
    const ChosenLosses losses = chosen_losses(scenario, ledgers, {});
    const auto rates = step_rates(losses.views[0], ChartUnits(DisplayUnits::inches));
    REQUIRE(rates.size() == 6);
    double stored_in = 0.0;
    for (const StepRates& rate : rates)
        stored_in += rate.stored * 5.0 / 60.0;
    CHECK_THAT(rates[2].rain, WithinRel(9.0 * 12.0 / 25.4, 1e-12));
    CHECK_THAT(rates[0].initial_loss, WithinRel(0.5 * 12.0 / 25.4, 1e-12));
    CHECK_THAT(stored_in, WithinRel(4.0 / 25.4, 1e-9));
}
