#include "rainledger/report/summary.hpp"
#include "report/sample.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

Scenario storms_named(const std::vector<std::string>& names) {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    const Storm storm = scenario.storms[0];
    scenario.storms.clear();
    for (const std::string& name : names) {
        scenario.storms.push_back(storm);
        scenario.storms.back().name = name;
    }
    return scenario;
}

/// The lines of the side by side, without its title and headings.
std::string rows_of(const Scenario& scenario, const std::vector<SiteLedger>& ledgers) {
    const std::string text = summary(scenario, ledgers);
    const std::size_t title = text.find("The storms side by side");
    REQUIRE(title != std::string::npos);
    const std::size_t rule = text.find("---\n", title);
    return text.substr(rule + 4, text.find("\n\n", rule) - rule - 3);
}

TEST_CASE("several storms stand side by side before each alone, and each has its own figures") {
    const Scenario scenario = storms_named({"gust", "long"});
    std::vector<SiteLedger> ledgers(2, sample::ledger_of_both());
    ledgers[1].site.total.rain_mm = 40.0;
    ledgers[1].site.total.excess_mm = 21.5;
    ledgers[1].site.figures = {137.6, 0.5375, 99.0, {212.0, 180.0, 150.0, 90.0}};
    ledgers[1].places[0] = ledgers[1].site;
    ledgers[1].places[0].name = "CB-2";
    const std::string rows = rows_of(scenario, ledgers);
    CHECK_THAT(rows, Contains("whole site, to CB-2  gust   12.9     8.5    54.2    0.66    180"));
    CHECK_THAT(rows,
               Contains("                       long   40.0    21.5   138      0.54    212   180  "
                        "   150      90.0\n"));
    const std::string text = summary(scenario, ledgers);
    CHECK(text.find("The storms side by side") < text.find("Storm gust"));
}

TEST_CASE("one storm alone has no side by side") {
    const std::vector<SiteLedger> ledgers{sample::ledger_of_both()};
    CHECK_THAT(summary(storms_named({"storm"}), ledgers), !Contains("side by side"));
}

TEST_CASE("with more than twelve storms the whole site stands alone") {
    SiteLedger ledger = sample::ledger_of_both();
    ledger.places.push_back(sample::joint("swale"));
    std::vector<std::string> names;
    for (int i = 1; i <= 13; ++i)
        names.push_back("event " + std::to_string(i));
    const std::vector<SiteLedger> of_many(names.size(), ledger);
    CHECK_THAT(rows_of(storms_named(names), of_many), !Contains("to swale"));
    names.pop_back();
    const std::vector<SiteLedger> of_twelve(names.size(), ledger);
    CHECK_THAT(rows_of(storms_named(names), of_twelve), Contains("to swale"));
}

}  // namespace
}  // namespace rainledger
