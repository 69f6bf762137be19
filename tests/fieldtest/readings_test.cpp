#include "rainledger/fieldtest/readings.hpp"

#include <limits>

#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kMinute = 1.0 / 60.0;

std::vector<ReadingRow> rows_of(const std::vector<double>& minutes,
                                const std::vector<double>& values) {
    std::vector<ReadingRow> rows;
    for (std::size_t i = 0; i < minutes.size(); ++i)
        rows.push_back({"", minutes[i] * kMinute, values[i], false});
    return rows;
}

InfiltrationTest reduced(const std::vector<ReadingRow>& rows, ReadingKind kind,
                         const std::optional<Rings>& rings = {}) {
    const ReducedReadings answer = reduce_readings(rows, kind, rings);
    REQUIRE(answer.problems.empty());
    REQUIRE(answer.tests.size() == 1);
    return answer.tests.front();
}

std::string problems_of(const std::vector<ReadingRow>& rows, ReadingKind kind,
                        const std::optional<Rings>& rings = {}) {
    const ReducedReadings answer = reduce_readings(rows, kind, rings);
    CHECK(answer.tests.empty() == !answer.problems.empty());
    std::string out;
    for (const ReadingProblem& problem : answer.problems)
        out += std::to_string(problem.row) + ": " + problem.message + " (" + problem.hint + ")\n";
    return out;
}

}  // namespace

TEST_CASE("every kind of reading of one test reduces to the same depths") {
    const auto drops = reduced(rows_of({5, 10, 20}, {12, 8, 10}), ReadingKind::drop);
    const auto depths = reduced(rows_of({0, 5, 10, 20}, {0, 12, 20, 30}), ReadingKind::infiltrated);
    // 300 mm across: 0.0706858 m2, so that 12 mm are 848.23 mL.
    const Rings rings{300.0, 600.0};
    const double mm = inner_area_m2(rings) / 1000.0;
    const auto volumes =
        reduced(rows_of({5, 10, 20}, {12 * mm, 8 * mm, 10 * mm}), ReadingKind::volume_added, rings);
    std::vector<ReadingRow> rows = rows_of({0, 5, 10, 10, 20}, {100, 88, 80, 110, 100});
    rows[3].refill = true;
    const auto levels = reduced(rows, ReadingKind::water_level);
    for (const InfiltrationTest* test : {&drops, &depths, &volumes, &levels}) {
        REQUIRE(test->readings.size() == 3);
        const TestReading& last = test->readings.back();
        CHECK_THAT(last.depth_mm, WithinRel(30.0, 1.0e-12));
        CHECK_THAT(last.interval_mm, WithinRel(10.0, 1.0e-12));
        CHECK_THAT(last.rate_mm_per_h, WithinRel(60.0, 1.0e-12));
        CHECK_THAT(last.middle_h, WithinRel(15.0 * kMinute, 1.0e-12));
        CHECK_THAT(test->readings.front().rate_mm_per_h, WithinRel(144.0, 1.0e-12));
        CHECK(test->readings.front().start_h == 0.0);
    }
    CHECK(drops.readings[1].row == 1);
    CHECK(levels.readings[2].row == 4);
    CHECK(errors_add_up(drops.kind));
    CHECK_FALSE(errors_add_up(levels.kind));
}

TEST_CASE("pits may alternate and are kept apart") {
    const std::vector<ReadingRow> rows{{"north", 5 * kMinute, 4.0, false},
                                       {"south", 5 * kMinute, 6.0, false},
                                       {"north", 10 * kMinute, 3.0, false},
                                       {"south", 15 * kMinute, 8.0, false}};
    const ReducedReadings answer = reduce_readings(rows, ReadingKind::drop, {});
    REQUIRE(answer.tests.size() == 2);
    CHECK(answer.tests[0].pit == "north");
    CHECK(answer.tests[0].readings.back().depth_mm == 7.0);
    CHECK(answer.tests[1].readings.back().depth_mm == 14.0);
    CHECK(answer.tests[1].readings.back().row == 3);
}

TEST_CASE("rows that cannot be are told by their index, all of them") {
    CHECK(problems_of(rows_of({5, 10, 10, 8, 20}, {5, 9, 9.5, 9.7, 8}), ReadingKind::infiltrated) ==
          "2: the time 10.00 min stands twice (give each time one row)\n"
          "3: the time 8.00 min comes before that of the row above, 10.00 min (put the rows in "
          "order of time)\n"
          "4: the infiltrated depth falls from 9 mm to 8 mm (give depths since the start of the "
          "test, or call the column drop)\n");
    CHECK(problems_of(rows_of({5, 10}, {5, -1}), ReadingKind::drop) ==
          "1: a drop of -1 mm is negative (a drop is how far the water fell since the reading "
          "before)\n");
    CHECK(problems_of(rows_of({0, 5}, {2, 5}), ReadingKind::infiltrated) ==
          "0: something has infiltrated at time 0 (a row at time 0 holds 0)\n");
    CHECK(problems_of(rows_of({-1, 5}, {2, 5}), ReadingKind::infiltrated) ==
          "0: the time is negative or not finite (times count from the start of the test)\n");
    CHECK(problems_of(rows_of({5, 6}, {2, std::numeric_limits<double>::infinity()}),
                      ReadingKind::infiltrated) == "1: the reading is not a finite number ()\n");
    CHECK(problems_of(rows_of({0}, {0}), ReadingKind::infiltrated) ==
          "0: the test has no reading after its start (give the readings that follow)\n");
}

TEST_CASE("volumes need sound rings") {
    CHECK(problems_of(rows_of({5}, {0.001}), ReadingKind::volume_added) ==
          "0: volumes need the inner ring's diameter to become depths ()\n");
    CHECK(problems_of(rows_of({5}, {-0.001}), ReadingKind::volume_added, Rings{300.0}) ==
          "0: a volume added is negative ()\n");
    CHECK(rings_problem({0.0}) == "the inner ring has no diameter");
    CHECK(rings_problem({300.0, 300.0}) == "the outer ring is no wider than the inner one");
    CHECK(rings_problem({300.0, 600.0}).empty());
}

TEST_CASE("refills out of order are told") {
    const auto refilled = [](std::vector<ReadingRow> rows, std::size_t at) {
        rows[at].refill = true;
        return rows;
    };
    CHECK(problems_of(refilled(rows_of({0, 5}, {100, 90}), 0), ReadingKind::water_level) ==
          "0: the first row is marked as a refill (begin with the level at time 0, unmarked)\n");
    CHECK(problems_of(refilled(rows_of({0, 5, 10, 15}, {100, 90, 110, 95}), 2),
                      ReadingKind::water_level) ==
          "2: a refill without the level just before it (give two rows of the same time: the level "
          "before filling, then the marked one after)\n");
    CHECK(
        problems_of(refilled(rows_of({0, 5, 5, 15}, {100, 90, 80, 75}), 2),
                    ReadingKind::water_level) ==
        "2: the refill to 80 mm does not raise the level of 90 mm (the marked row holds the level "
        "after filling up)\n");
    CHECK(problems_of(rows_of({0, 5, 5, 15}, {100, 90, 110, 95}), ReadingKind::water_level) ==
          "2: the time 5.00 min stands twice (mark the second row as a refill if it is the level "
          "after filling up)\n"
          "3: the water rises from 90 mm to 95 mm (mark a refill; a level is a height, so that it "
          "falls as water infiltrates)\n");
    CHECK(problems_of(refilled(refilled(rows_of({0, 5, 5, 5, 9}, {100, 90, 110, 120, 95}), 2), 3),
                      ReadingKind::water_level) ==
          "3: a refill follows a refill (give a level between the two)\n");
    CHECK(problems_of(rows_of({5, 10}, {100, 90}), ReadingKind::water_level) ==
          "0: the first level is of 5.00 min (begin with the level at time 0)\n");
    CHECK(problems_of(refilled(rows_of({5, 10}, {10, 9}), 1), ReadingKind::drop) ==
          "1: a refill is marked beside readings of another kind (refills belong to water "
          "levels)\n");
}

TEST_CASE("water may be filled up again and again") {
    std::vector<ReadingRow> rows = rows_of({0, 5, 5, 10, 10, 15}, {100, 80, 100, 85, 100, 90});
    rows[2].refill = true;
    rows[4].refill = true;
    CHECK_THAT(reduced(rows, ReadingKind::water_level).readings.back().depth_mm,
               WithinRel(45.0, 1.0e-12));
}

TEST_CASE("the first readings can be left out") {
    const auto test = reduced(rows_of({5, 10, 20}, {12, 8, 10}), ReadingKind::drop);
    const InfiltrationTest all = without_first(test, 0.0);
    CHECK(all.readings.size() == 3);
    CHECK(all.from_h == 0.0);
    const InfiltrationTest rest = without_first(test, 4.0 * kMinute);
    REQUIRE(rest.readings.size() == 2);
    CHECK_THAT(rest.from_h, WithinRel(5.0 * kMinute, 1.0e-12));
    CHECK_THAT(rest.readings.back().depth_mm, WithinRel(18.0, 1.0e-12));
    // An interval that begins before the time ignored goes with it.
    CHECK(without_first(test, 7.0 * kMinute).readings.size() == 1);
    CHECK(without_first(test, 30.0 * kMinute).readings.empty());
}

}  // namespace rainledger
