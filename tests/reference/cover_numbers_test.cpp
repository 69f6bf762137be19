#include "rainledger/reference/cover_numbers.hpp"

#include <algorithm>

#include "test.hpp"

namespace rainledger {
namespace {

using enum HydrologicCondition;

std::string problem_of(const CoverAsked& asked) {
    const auto answer = find_cover(asked);
    CHECK_FALSE(answer.value);
    return answer.problem + " | " + answer.hint;
}

int number_of(const CoverAsked& asked, SoilGroup group) {
    const auto row = find_cover(asked);
    REQUIRE(row.value);
    return *cover_number(**row.value, group).value;
}

}  // namespace

TEST_CASE("numbers rise from soil group A to D") {
    for (const CoverRow& row : cover_rows()) {
        INFO(row.name << ", " << row.treatment);
        CHECK(row.numbers[3]);
        for (std::size_t i = 1; i < 4; ++i)
            if (row.numbers[i - 1]) CHECK(*row.numbers[i - 1] <= *row.numbers[i]);
    }
}

TEST_CASE("a poorer condition never lowers a number") {
    for (const CoverRow& poorer : cover_rows())
        for (const CoverRow& better : cover_rows()) {
            const bool same = poorer.name == better.name && poorer.treatment == better.treatment;
            if (!same || poorer.condition >= better.condition) continue;
            INFO(poorer.name << ", " << poorer.treatment);
            for (std::size_t i = 0; i < 4; ++i)
                if (poorer.numbers[i]) CHECK(*poorer.numbers[i] > *better.numbers[i]);
        }
}

TEST_CASE("contouring, terraces and residue never raise a number") {
    const auto at_most = [](std::string_view treated, std::string_view plain) {
        for (const std::string_view cover : {"row crops", "small grain"})
            for (const HydrologicCondition condition : {poor, good})
                for (const SoilGroup group :
                     {SoilGroup::A, SoilGroup::B, SoilGroup::C, SoilGroup::D}) {
                    INFO(cover << ": " << treated << " and " << plain);
                    CHECK(number_of({cover, treated, condition}, group) <=
                          number_of({cover, plain, condition}, group));
                }
    };
    at_most("straight row, crop residue", "straight row");
    at_most("contoured", "straight row");
    at_most("contoured, crop residue", "contoured");
    at_most("contoured and terraced", "contoured");
    at_most("contoured and terraced, crop residue", "contoured and terraced");
}

TEST_CASE("every row is found by its own words, and no two rows by the same") {
    for (const CoverRow& row : cover_rows()) {
        const auto found = find_cover({row.name, row.treatment, row.condition});
        REQUIRE(found.value);
        CHECK(*found.value == &row);
    }
}

// TR-55 (1986), example 2-1: pasture in good condition, 61 on soil B and 74 on soil C.
TEST_CASE("a cover is named forgivingly") {
    CHECK(number_of({"Pasture or Range", "", good}, SoilGroup::B) == 61);
    CHECK(number_of({"pasture_or_range", "", good}, SoilGroup::C) == 74);
    CHECK(number_of({"Residential-lots of 1/2 acre"}, SoilGroup::C) == 80);
    CHECK(find_condition("GOOD") == good);
    CHECK_FALSE(find_condition("excellent"));
    CHECK_FALSE(find_condition(""));
}

TEST_CASE("what is missing or unknown of a cover is said with what there is") {
    CHECK(problem_of({"open space"}) == "open space needs a condition | one of: poor; fair; good");
    CHECK(problem_of({"opne space", "", good}) ==
          "unknown cover 'opne space' | did you mean 'open space'?");
    CHECK(problem_of({"gravel"}) == "unknown cover 'gravel' | covers of that kind: gravel streets");
    CHECK(problem_of({"industrial", "", good}) ==
          "the tables make no difference of condition for industrial | ");
    CHECK(problem_of({"open space", "contoured", good}) ==
          "the tables know no treatment of open space | ");
    CHECK(problem_of({"fallow"}) == "fallow needs a treatment | one of: bare soil; crop residue");
    CHECK(problem_of({"fallow", "contuored"}) ==
          "unknown treatment 'contuored' of fallow | one of: bare soil; crop residue");
    CHECK(problem_of({"fallow", "crop residues", good}) ==
          "unknown treatment 'crop residues' of fallow | did you mean 'crop residue'?");
    CHECK(problem_of({"fallow", "crop residue", fair}) ==
          "the tables have no condition 'fair' of fallow, crop residue | one of: poor; good");
}

TEST_CASE("a rangeland without a number for group A says so") {
    const auto row = find_cover({"oak-aspen", "", fair});
    REQUIRE(row.value);
    const auto number = cover_number(**row.value, SoilGroup::A);
    CHECK_FALSE(number.value);
    CHECK(number.problem == "the table has no number of oak-aspen, fair condition on soil group A");
    CHECK(*cover_number(**row.value, SoilGroup::B).value == 48);
}

TEST_CASE("a cover shows its full name, its numbers and where sources disagree") {
    const RowView woods = view_of(**find_cover({"woods", "", good}).value);
    CHECK(woods.name == "woods, good condition");
    CHECK(*woods.values[0].published.value == 30.0);
    REQUIRE(woods.notes.size() == 1);
    CHECK(woods.notes[0] ==
          "group A: 25 in the older list (Beven, table B6.3.1, after SCS 1985); TR-55 sets numbers "
          "under 30 to 30");
    const RowView industry = view_of(**find_cover({"industrial"}).value);
    REQUIRE(industry.values.size() == 5);
    CHECK(industry.values[4].key == "impervious_percent");
    CHECK(*industry.values[4].published.value == 72.0);
}

}  // namespace rainledger
