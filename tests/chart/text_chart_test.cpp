#include <sstream>
#include <string>

#include "chart/drawing.hpp"
#include "chart/scenes.hpp"
#include "rainledger/chart/chart.hpp"
#include "test.hpp"

using namespace rainledger;

namespace {

std::string hyetograph(const Scenario& scenario, DisplayUnits units = DisplayUnits::metric) {
    return *hyetograph_chart(scenario, {ChartFormat::text, units}).bytes;
}

std::string losses(const Scenario& scenario, const ChartChoice& choice = {}) {
    const auto ledgers = scenes::ledgers_of(scenario);
    return *losses_chart(scenario, ledgers, choice, {ChartFormat::text, DisplayUnits::metric})
                .bytes;
}

std::size_t widest(const std::string& text) {
    std::size_t most = 0;
    std::istringstream lines(text);
    for (std::string line; std::getline(lines, line);)
        most = std::max(most, columns_used(line));
    return most;
}

Scenario several() {
    const std::string title(300, 'W');
    return scenes::scenario_of(title,
                               {scenes::storm_of(title, scenes::half_an_hour()),
                                scenes::storm_of("uneven", scenes::uneven()),
                                scenes::storm_of("dry", make_hyetograph({0.0, 1.0}, "h", {0.0})),
                                scenes::storm_of("long", scenes::over_midnight())},
                               {scenes::lawn(), scenes::roof()});
}

/// A lawn and a roof under half an hour of rain, and under none.
Scenario with_a_dry_storm() {
    return scenes::scenario_of("Millbrook depot",
                               {scenes::storm_of("2 years", scenes::half_an_hour()),
                                scenes::storm_of("dry", make_hyetograph({0.0, 1.0}, "h", {0.0}))},
                               {scenes::lawn(), scenes::roof()});
}

}  // namespace

TEST_CASE("no line of a chart in text is wider than a hundred columns or ends in a blank") {
    const Scenario scenario = several();
    Scenario stamped = several();
    stamped.storms = {scenario.storms[3]};
    for (const std::string& text :
         {hyetograph(scenario), hyetograph(stamped), losses(scenario), losses(scenario, {0, {}}),
          losses(scenario, {{}, 0}), losses(scenario, {1, 0}), losses(scenario, {2, 0}),
          losses(scenario, {3, 1})}) {
        INFO(text);
        CHECK(widest(text) <= 100);
        CHECK(text.ends_with("\n"));
        CHECK(text.find(" \n") == std::string::npos);
    }
}

TEST_CASE("a hyetograph in text: 108 mm/h is 8.5 of twelve rows to 6 in/h") {
    CHECK(hyetograph(scenes::one_lawn(), DisplayUnits::inches) == R"(A lawn at Quarry Row
0.79 in in 30 min, peak 4.25 in/h over 5 min

in/h
     6 ┤
       │
       │
       │                              ▄▄▄▄▄▄▄▄▄▄▄▄▄▄▄
     4 ┤                              ███████████████
       │                              ███████████████
       │                              ███████████████
       │                              ███████████████▆▆▆▆▆▆▆▆▆▆▆▆▆▆▆
     2 ┤                              ██████████████████████████████
       │               ▇▇▇▇▇▇▇▇▇▇▇▇▇▇▇██████████████████████████████
       │               █████████████████████████████████████████████▇▇▇▇▇▇▇▇▇▇▇▇▇▇▇
       │▄▄▄▄▄▄▄▄▄▄▄▄▄▄▄████████████████████████████████████████████████████████████▄▄▄▄▄▄▄▄▄▄▄▄▄▄▄
     0 └┬──────────────┬──────────────┬──────────────┬──────────────┬──────────────┬─────────────┬
      0:00           0:05           0:10           0:15           0:20           0:25          0:30
        time [h:min]

Rain figures are estimates from past records; local codes and a licensed engineer decide.
)");
}

TEST_CASE("a design storm without a name says how rare it is") {
    Scenario scenario = scenes::one_lawn();
    DesignOrigin design;
    design.return_period_yr = 10.0;
    scenario.storms.front().origin = design;
    CHECK_THAT(hyetograph(scenario), Contains("\nreturn period 10 yr, 20.0 mm in 30 min, peak "
                                              "108.0 mm/h over 5 min\n"));
    scenario.storms.front().name = "wet";
    CHECK_THAT(hyetograph(scenario), Contains("\nstorm wet, 20.0 mm in"));
}

TEST_CASE("a ledger in text") {
    CHECK(losses(scenes::one_lawn()) == R"(A lawn at Quarry Row
lawn, Horton by infiltrated depth; excess 5.0 mm, volumetric runoff coefficient 0.25

rain, mm/h
     0 ┤▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀█████████████████████████████████████████████▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀
       │                              ███████████████▀▀▀▀▀▀▀▀▀▀▀▀▀▀▀
       │                              ███████████████
   150 ┤

where it goes, mm/h
   150 ┤
       │
       │
       │                              ███████████████
   100 ┤                              ███████████████
       │                              ▒▒▒▒▒▒▒▒▒▒▒▒▒▒▒
       │                              ▒▒▒▒▒▒▒▒▒▒▒▒▒▒▒
       │                              ▒▒▒▒▒▒▒▒▒▒▒▒▒▒▒███████████████
    50 ┤                              ▒▒▒▒▒▒▒▒▒▒▒▒▒▒▒███████████████
       │               ▒▒▒▒▒▒▒▒▒▒▒▒▒▒▒░░░░░░░░░░░░░░░███████████████
       │               ░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░
       │               ░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░
     0 └┬──────────────┬──────────────┬──────────────┬──────────────┬──────────────┬─────────────┬
      0:00           0:05           0:10           0:15           0:20           0:25          0:30
        time [h:min]
ponded                               ▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬

rain            20.0 mm     ──────────────────────────────────────────────────────────────────────
infiltrated     10.8 mm     ░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░
initial loss    1.0 mm      ▒▒▒▒
ponded          3.1 mm      ▒▒▒▒▒▒▒▒▒▒▒
excess          5.0 mm      ██████████████████

This is an estimate from assumed losses; local codes and a licensed engineer decide.
)");
}

TEST_CASE("the figures of a ledger are told whole, however long the names are") {
    const auto below_title = [](const std::string& storm) {
        const std::string text = losses(
            scenes::scenario_of("Quarry Row", {scenes::storm_of(storm, scenes::half_an_hour())}));
        const std::size_t at = text.find('\n') + 1;
        return text.substr(at, text.find('\n', at) - at);
    };
    CHECK(below_title("gauge in June") ==
          "lawn, Horton by infiltrated depth, storm gauge in June; excess 5.0 mm, coefficient by "
          "volume 0.25");
    CHECK(below_title(std::string(80, 'W')) ==
          "lawn, Horton by infiltrated depth, storm " + std::string(11, 'W') +
              "...; excess 5.0 mm, coefficient by volume 0.25");
}

TEST_CASE("several storms in text, one of them dry") {
    CHECK(hyetograph(with_a_dry_storm()) == R"(Millbrook depot
rain of each storm; full height 200 mm/h

2 years: 20.0 mm, peak 108.0 mm/h
                       ▁▁▁▁▁▁▁
        ▁▁▁▁▁▁▁▃▃▃▃▃▃▃▃███████▅▅▅▅▅▅▅▅▂▂▂▂▂▂▂▁▁▁▁▁▁▁▁

dry: no rain

     0 └┬──────────────┬──────────────┬──────────────┬──────────────┬──────────────┬─────────────┬
      0:00           0:10           0:20           0:30           0:40           0:50          1:00
        time from the start of each storm [h:min]

Rain figures are estimates from past records; local codes and a licensed engineer decide.
)");
}

TEST_CASE("surfaces side by side in text") {
    CHECK(losses(with_a_dry_storm(), {0, {}}) == R"(Millbrook depot
storm 2 years, every surface; full height 200 mm/h

lawn (Horton by infiltrated depth): excess 5.0 mm, coefficient 0.25
                                      ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁
supply  ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁▃▃▃▃▃▃▃▃▃▃▃▃▃▃▃███████████████▅▅▅▅▅▅▅▅▅▅▅▅▅▅▅▂▂▂▂▂▂▂▂▂▂▂▂▂▂▂▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁
excess                                ▂▂▂▂▂▂▂▂▂▂▂▂▂▂▂▃▃▃▃▃▃▃▃▃▃▃▃▃▃▃▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁

roof (impervious): excess 20.0 mm, coefficient 1.00
                                      ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁
supply  ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁▃▃▃▃▃▃▃▃▃▃▃▃▃▃▃███████████████▅▅▅▅▅▅▅▅▅▅▅▅▅▅▅▂▂▂▂▂▂▂▂▂▂▂▂▂▂▂▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁
                                      ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁
excess  ▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁▃▃▃▃▃▃▃▃▃▃▃▃▃▃▃███████████████▅▅▅▅▅▅▅▅▅▅▅▅▅▅▅▂▂▂▂▂▂▂▂▂▂▂▂▂▂▂▁▁▁▁▁▁▁▁▁▁▁▁▁▁▁

     0 └┬──────────────┬──────────────┬──────────────┬──────────────┬──────────────┬─────────────┬
      0:00           0:05           0:10           0:15           0:20           0:25          0:30
        time [h:min]

This is an estimate from assumed losses; local codes and a licensed engineer decide.
)");
}
