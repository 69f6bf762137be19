#include "rainledger/reference/composite_number.hpp"

#include <cmath>
#include <limits>

#include "rainledger/reference/cover_numbers.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

double composite(double pervious, double impervious, double connected = 1.0) {
    const auto answer = composite_number({pervious, impervious, connected});
    REQUIRE(answer.value);
    return answer.value->number;
}

}  // namespace

// The rows of table 2-2a with an average impervious area were made from figure 2-3 with open space
// in good condition; one number of 32 does not come out, and its row says so.
TEST_CASE("urban rows come out of their impervious share, but for one number") {
    const CoverRow* lawn = *find_cover({"open space", "", HydrologicCondition::good}).value;
    int wrong = 0;
    for (const CoverRow& row : cover_rows()) {
        if (!row.impervious_percent) continue;
        int wrong_here = 0;
        for (std::size_t i = 0; i < 4; ++i) {
            const double made = composite(*lawn->numbers[i], *row.impervious_percent / 100.0);
            if (std::abs(made - *row.numbers[i]) > 0.5 + 1e-9) ++wrong_here;
        }
        INFO(row.name);
        CHECK((wrong_here > 0) == !row.note.empty());
        wrong += wrong_here;
    }
    CHECK(wrong == 1);
}

TEST_CASE("nothing impervious leaves the number and everything gives 98") {
    CHECK(composite(61.0, 0.0) == 61.0);
    CHECK(composite(61.0, 0.0, 0.2) == 61.0);
    CHECK_THAT(composite(61.0, 1.0), WithinAbs(98.0, 1e-12));
}

TEST_CASE("less connection never raises the number, and all of it is figure 2-3") {
    for (const double pervious : {30.0, 61.0, 90.0})
        for (const double share : {0.05, 0.2, 0.29}) {
            double before = composite(pervious, share, 0.0);
            CHECK_THAT(before, WithinAbs(pervious + 0.5 * share * (98.0 - pervious), 1e-12));
            for (const double connected : {0.25, 0.5, 0.75, 1.0}) {
                const double now = composite(pervious, share, connected);
                CHECK(now > before);
                before = now;
            }
        }
}

TEST_CASE("from 30 % on, unconnected area counts as connected, and the figure is named") {
    CHECK(composite(74.0, 0.30, 0.0) == composite(74.0, 0.30, 1.0));
    CHECK(composite_number({74.0, 0.30, 0.0}).value->provenance.place == "figure 2-3 as equation");
    CHECK(composite_number({74.0, 0.29, 0.0}).value->provenance.place == "figure 2-4 as equation");
    CHECK(composite_number({74.0, 0.29, 1.0}).value->provenance.place == "figure 2-3 as equation");
}

TEST_CASE("numbers and shares outside their ranges are refused") {
    constexpr double kNone = std::numeric_limits<double>::quiet_NaN();
    for (const double number : {0.0, -1.0, 100.5, kNone})
        CHECK(composite_number({number, 0.1, 1.0}).problem ==
              "the curve number of the pervious part must be above 0 and at most 100");
    for (const double share : {-0.1, 1.1, kNone}) {
        CHECK(composite_number({74.0, share, 1.0}).problem ==
              "the impervious share must lie between 0 and 1");
        CHECK(composite_number({74.0, 0.1, share}).problem ==
              "the connected share must lie between 0 and 1");
    }
}

}  // namespace rainledger
