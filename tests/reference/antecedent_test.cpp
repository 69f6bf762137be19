#include "rainledger/reference/antecedent.hpp"

#include <cstddef>

#include "test.hpp"

namespace rainledger {

TEST_CASE("the antecedent table falls from row to row and holds I <= II <= III") {
    const auto table = antecedent_table();
    REQUIRE(table.size() == 77);
    CHECK(table.front().condition_2 == 100);
    CHECK(table.back().condition_2 == 0);
    for (std::size_t i = 0; i < table.size(); ++i) {
        CHECK(table[i].condition_1 <= table[i].condition_2);
        CHECK(table[i].condition_3 >= table[i].condition_2);
        if (i == 0) continue;
        CHECK(table[i].condition_2 < table[i - 1].condition_2);
        CHECK(table[i].condition_1 <= table[i - 1].condition_1);
        CHECK(table[i].condition_3 <= table[i - 1].condition_3);
    }
}

// Rows of NEH Part 630, chapter 10, table 10-1: 80 as reprinted in Beven, Rainfall-Runoff
// Modelling: The Primer, table B6.3.2; 81, 25 and 5 from memory.
TEST_CASE("numbers between rows are interpolated") {
    CHECK(antecedent_dry(80.0) == 63.0);
    CHECK(antecedent_wet(80.0) == 91.0);
    CHECK_THAT(antecedent_dry(80.5), WithinAbs(63.5, 1e-12));
    CHECK_THAT(antecedent_wet(28.0), WithinAbs(43.0 + 0.6 * 7.0, 1e-12));
    CHECK(antecedent_dry(100.0) == 100.0);
    CHECK(antecedent_wet(100.0) == 100.0);
    CHECK_THAT(antecedent_wet(2.5), WithinAbs(6.5, 1e-12));
}

TEST_CASE("a row says whether it was seen") {
    CHECK(citation(antecedent_provenance(80.0)) ==
          "USDA NRCS: National Engineering Handbook, Part 630, chapter 10, Estimation of direct "
          "runoff from storm rainfall, 2004, table 10-1 (confirmed; in Beven, table B6.3.2, after "
          "USDA-SCS 1985)");
    CHECK(antecedent_provenance(81.0).status == Status::from_memory);
    CHECK(antecedent_provenance(80.5).status == Status::from_memory);
    CHECK(antecedent_provenance(20.0).status == Status::from_memory);
}

}  // namespace rainledger
