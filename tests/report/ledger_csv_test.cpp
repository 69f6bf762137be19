#include "rainledger/report/ledger_csv.hpp"

#include "rainledger/base/number.hpp"
#include "report/sample.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

std::string csv_of(const Scenario& scenario, const SiteLedger& ledger) {
    std::string out;
    append_ledger_header(out, has_start_column(scenario));
    append_ledger_rows(out, scenario.site, scenario.storms[0], ledger, has_start_column(scenario));
    return out;
}

}  // namespace

TEST_CASE("the ledger CSV: surfaces, places, site; an unlimited or missing capacity is empty") {
    CHECK(csv_of(sample::verge_and_parking(sample::two_steps()), sample::ledger_of_both()) ==
          "storm,drains_to,surface,step,start_h,end_h,rain_mm,run_on_mm,initial_loss_mm,"
          "infiltrated_mm,ponded_mm,excess_mm,capacity_mm_per_h\n"
          "storm,CB-2,verge,1,0,0.08333333333333333,0.4,0,0.4,0,0,0,\n"
          "storm,CB-2,verge,2,0.08333333333333333,0.16666666666666666,12.5,9,0.6,8.25,4,8.65,32.5\n"
          "storm,CB-2,parking,1,0,0.08333333333333333,0.4,0,0,0,0.4,0,0\n"
          "storm,CB-2,parking,2,0.08333333333333333,0.16666666666666666,12.5,0,0,0,1.5,11.4,0\n"
          "storm,CB-2,,1,0,0.08333333333333333,0.4,0,0.1,0,0.3,0,\n"
          "storm,CB-2,,2,0.08333333333333333,0.16666666666666666,12.5,0,0.15,2.0625,2.125,8.4625,\n"
          "storm,,,1,0,0.08333333333333333,0.4,0,0.1,0,0.3,0,\n"
          "storm,,,2,0.08333333333333333,0.16666666666666666,12.5,0,0.15,2.0625,2.125,8.4625,\n");
}

TEST_CASE("with timestamps a last column repeats each step's start") {
    const std::string csv =
        csv_of(sample::verge_and_parking(sample::two_stamped_steps()), sample::ledger_of_both());
    CHECK_THAT(csv, Contains(",capacity_mm_per_h,start\n"));
    CHECK_THAT(csv, Contains("storm,CB-2,verge,1,0,0.08333333333333333,0.4,0,0.4,0,0,0,,"
                             "2026-03-04T23:50:00+01:00\n"));
    CHECK_THAT(csv, Contains("8.65,32.5,2026-03-04T23:55:00+01:00\n"));
}

TEST_CASE("beside a storm with timestamps, one without leaves the column empty") {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    scenario.storms.push_back(sample::storm_of(sample::two_stamped_steps()));
    REQUIRE(has_start_column(scenario));
    const std::string csv = csv_of(scenario, sample::ledger_of_both());
    CHECK_THAT(csv, Contains("8.65,32.5,\n"));
}

TEST_CASE("reporting steps carry their own edges and stamps") {
    const Scenario scenario = sample::verge_and_parking(sample::two_stamped_steps());
    ReportedLedger reported;
    reported.edges_h = {0.0, 0.125, 10.0 / 60.0};
    reported.ledger = sample::ledger_of_both();
    std::string csv;
    append_ledger_rows(csv, scenario.site, scenario.storms[0], reported, true);
    CHECK_THAT(csv, Contains("storm,CB-2,verge,2,0.125,0.16666666666666666,12.5,9,0.6,8.25,4,"
                             "8.65,32.5,2026-03-04T23:57:30+01:00\n"));
}

TEST_CASE("a name with a quote stands in quotes, the quote doubled") {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    scenario.site.surfaces[0].name = "12\" verge";
    const std::string csv = csv_of(scenario, sample::ledger_of_both());
    CHECK_THAT(csv, Contains("storm,CB-2,\"12\"\" verge\",1,"));
}

TEST_CASE("every number parses back to the same double") {
    SiteLedger ledger = sample::ledger_of_both();
    Accounts& accounts = ledger.surfaces[0].rows[0].accounts;
    accounts = {1.0 / 3.0, -0.1, 5.0e-324, 1.7976931348623157e308, 0.1 + 0.2, -0.0};
    const std::string csv = csv_of(sample::verge_and_parking(sample::two_steps()), ledger);
    std::string row = "verge,1,0,0.08333333333333333";
    for (const double value : {accounts.rain_mm, accounts.run_on_mm, accounts.initial_loss_mm,
                               accounts.infiltrated_mm, accounts.ponded_mm})
        row += "," + shortest(value);
    CHECK_THAT(csv, Contains(row + ",0,\n"));
    CHECK(parse_number(shortest(accounts.ponded_mm)) == accounts.ponded_mm);
}

}  // namespace rainledger
