#include <string>
#include <utility>
#include <vector>

#include "rainledger/scenario/warnings.hpp"
#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

struct Marched {
    Scenario scenario;
    SiteLedger ledger;
};

Marched march(const std::string& yaml) {
    Outcome outcome = read_text_of_test(yaml);
    INFO(outcome.problems);
    REQUIRE(outcome.scenario);
    Marched marched{*std::move(outcome.scenario), {}};
    marched.ledger = keep_ledger(marched.scenario.site, marched.scenario.storms[0].rain);
    return marched;
}

/// The warnings as "LINE:COLUMN: MESSAGE".
std::vector<std::string> warnings_of(const Marched& marched) {
    Diagnostics diagnostics;
    warn_of_results(marched.scenario, marched.scenario.storms[0], marched.ledger, diagnostics);
    std::vector<std::string> out;
    for (const Diagnostic& each : diagnostics.list())
        out.push_back(std::to_string(each.place.line) + ":" + std::to_string(each.place.column) +
                      ": " + each.message);
    return out;
}

std::vector<std::string> warnings_of(const std::string& yaml) {
    return warnings_of(march(yaml));
}

std::string named_storm(const std::string& steps, const std::string& losses) {
    return "storms: {morning: {steps: " + steps +
           "}}\nsurfaces: {lawn: {area: 1 ha, losses: " + losses + "}}\n";
}

using Strings = std::vector<std::string>;

}  // namespace

TEST_CASE("a curve number with little excess") {
    // CN 80: S = 63.5 mm, Ia = 12.7 mm. 20 mm of rain leave 7.3^2/70.8 = 0.75 mm; 12 mm leave none.
    CHECK(
        warnings_of(
            named_storm("{every: 10 h, depths: [20], unit: mm}", "{curve_number: {number: 80}}")) ==
        Strings{"2:12: lawn in morning: a curve number answers poorly under 12.7 mm of excess, and "
                "this is 0.8 mm"});
    CHECK(
        warnings_of(
            named_storm("{every: 10 h, depths: [12], unit: mm}", "{curve_number: {number: 80}}")) ==
        Strings{"2:12: lawn in morning: a curve number answers poorly under 12.7 mm of excess, and "
                "this is 0.0 mm"});
    CHECK(warnings_of(
              named_storm("{every: 10 h, depths: [0], unit: mm}", "{curve_number: {number: 80}}"))
              .empty());
    CHECK(warnings_of(
              named_storm("{every: 10 h, depths: [100], unit: mm}", "{curve_number: {number: 80}}"))
              .empty());
}

TEST_CASE("a step long against the ponding time") {
    // An initial loss of 5 mm fills 45 min into 1 h steps of 0, 20/3 mm; ponding follows at once.
    const std::string law = "{constant_rate: {rate: 1 mm/h, initial_loss: 5 mm}}";
    CHECK(warnings_of("storm: {steps: {every: 60 min, depths: [0, 6.6666666666666667], unit: mm}}\n"
                      "surfaces: {lawn: {area: 1 ha, losses: " +
                      law + "}}\n") ==
          Strings{
              "2:12: lawn: the rain's step of 60 min is long against the 45 min from first rain to "
              "ponding; finer rain would pond at another time"});
    CHECK(warnings_of("storm: {steps: {every: 15 min, depths: [0, 1, 1, 1, 1, 2, 2], unit: mm}}\n"
                      "surfaces: {lawn: {area: 1 ha, losses: " +
                      law + "}}\n")
              .empty());
}

TEST_CASE("ponding with the first rain, or on no soil at all, says nothing of the step") {
    CHECK(warnings_of(with_storm("{steps: {every: 1 h, depths: [5, 5], unit: mm}}")).empty());
    CHECK(warnings_of(named_storm("{every: 1 h, depths: [5, 5], unit: mm}",
                                  "{constant_rate: {rate: 1 mm/h}}"))
              .empty());
    CHECK(warnings_of(named_storm("{every: 1 h, depths: [0, 0], unit: mm}",
                                  "{constant_rate: {rate: 1 mm/h}}"))
              .empty());
}

TEST_CASE("what was taken as dry and what stayed coarse are told of the storm and the site") {
    Marched marched = march(with_losses("impervious"));
    marched.scenario.storms[0].rain.taken_as_dry_h = 0.25;
    marched.ledger.coarse_run_on = CoarseRunOn{3e-6};
    CHECK(warnings_of(marched) ==
          Strings{"1:1: storm: 15 min of the record had no values and were taken as dry",
                  "1:1: site: run-on below a surface that infiltrates is handed over in parts of a "
                  "step that leave the accounts below it uncertain by 0.000003 mm"});
}

TEST_CASE("a phi index that cannot be matched is an error at the observed excess") {
    // 16 mm of rain on bare soil: no rate leaves more.
    const Marched marched = march(with_losses("{phi_index: {observed_excess: 40 mm}}"));
    Diagnostics diagnostics;
    report_unmatched(marched.scenario, marched.scenario.storms[0], marched.ledger, diagnostics);
    REQUIRE(diagnostics.error_count() == 1);
    CHECK(
        render(diagnostics.list()[0]) ==
        R"(lane.yaml:5:43: error: more excess observed (40 mm) than any loss rate leaves (16 mm at rate 0)
        losses: {phi_index: {observed_excess: 40 mm}}
                                              ^
    check the observed excess, the rain, and the stores that come before the rate
)");
}

TEST_CASE("a phi index that is matched is no error") {
    const Marched marched = march(with_losses("{phi_index: {observed_excess: 4 mm}}"));
    Diagnostics diagnostics;
    report_unmatched(marched.scenario, marched.scenario.storms[0], marched.ledger, diagnostics);
    CHECK(diagnostics.list().empty());
}

}  // namespace rainledger
