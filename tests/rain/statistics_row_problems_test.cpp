#include <string>

#include "rain/statistics_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("slips in the durations") {
    SECTION("without a unit") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5,8,12\n"
                             "10,12,19\n") ==
              R"(county.csv:2:1: error: duration '5' has no unit
    5,8,12
    ^
    name it in the header, 'duration [min]', or in each row, '5 min'
)");
    }
    SECTION("not a duration") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8,12\n"
                             "10 mm,12,19\n"
                             "15 min,15,23\n") ==
              R"(county.csv:3:1: error: '10 mm' is not a duration
    10 mm,12,19
    ^
    write durations as '5 min', '60-min', '24-hr' or '2 d'
)");
    }
    SECTION("a number out of place") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8,12\n"
                             "60;27;41\n") ==
              R"(county.csv:3:1: error: '60;27;41' is not a duration
    60;27;41
    ^
    write durations as '5 min', '60-min', '24-hr' or '2 d'
)");
    }
    SECTION("not rising") {
        CHECK(table_problems("duration [min],2 yr [mm],10 yr\n"
                             "5,8,12\n"
                             "60,27,41\n"
                             "30,21,32\n"
                             "1 h,27,41\n") ==
              R"(county.csv:4:1: error: durations must rise, but 30 min comes after 1 h
    30,21,32
    ^
    write each duration once, the shortest first
county.csv:5:1: error: durations must rise, but 1 h comes after 1 h
    1 h,27,41
    ^
    write each duration once, the shortest first
)");
    }
    SECTION("out of range") {
        CHECK(
            table_problems(std::string("duration [d],2 yr [mm],10 yr\n") + std::string(308, '9') +
                           ",8,12\n") ==
            R"(county.csv:2:1: error: duration '9999999999999999999999999999999999999999...' is out of range
    999999999999999999999999999999999999999999999999999999999999999999999999999999999999999999999999...
    ^
    check its digits and its unit
)");
    }
    SECTION("apart") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8,12\n"
                             "by the county office\n"
                             "1 h,27,41\n") ==
              R"(county.csv:4:1: error: this row stands apart from the table above it
    1 h,27,41
    ^
    take out the line between, or repeat the row of return periods above a further block
)");
    }
    SECTION("an open quote") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "\"5 min,8,12\n"
                             "1 h,27,41\n") ==
              R"(county.csv:2:1: error: the quote that opens here is not closed on this line
    "5 min,8,12
    ^
    a cell in quotes ends with a quote; a quote inside it is doubled
)");
    }
}

TEST_CASE("return periods down and bare durations across are not taken for the reverse") {
    CHECK(table_problems("Return period [yr],5,60\n"
                         "2,8,27\n"
                         "10,12,41\n"
                         "Depths in mm\n") ==
          R"(county.csv:1:1: error: the table does not say the unit of its values
    Return period [yr],5,60
    ^
    write it in the header, as in '10 yr [mm]', or in a line above it: 'depth [mm]', 'intensity [in/h]'
county.csv:2:1: error: duration '2' has no unit
    2,8,27
    ^
    rows are durations, '5 min', and columns return periods: write the unit in each row, or turn the table round
)");
}

TEST_CASE("slips in the values") {
    SECTION("missing") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,,12\n") ==
              R"(county.csv:2:7: error: the value is missing here
    5 min,,12
          ^
    give a value to each column of the header; leave out a duration that lacks one
)");
    }
    SECTION("too few") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8\n"
                             "1 h,27,41\n") ==
              R"(county.csv:2:7: error: this row ends after 1 of 2 values
    5 min,8
          ^
    give a value to each column of the header; leave out a duration that lacks one
)");
    }
    SECTION("too many") {
        CHECK(
            table_problems("duration,2 yr [mm],10 yr\n"
                           "5 min,8,12,15\n"
                           "1 h,27,41\n") ==
            R"(county.csv:2:12: error: there are more values in this row than columns in the header
    5 min,8,12,15
               ^
    give a value to each column of the header, and no more
)");
    }
    SECTION("no number") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8,n/a\n") ==
              R"(county.csv:2:9: error: 'n/a' is not a number
    5 min,8,n/a
            ^
    give a value to each column of the header; leave out a duration that lacks one
)");
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8,12.5*\n"
                             "24 h,\"1,058.0\",1200\n") ==
              R"(county.csv:2:9: error: '12.5*' is not a number
    5 min,8,12.5*
            ^
    write digits alone, such as 12.5
county.csv:3:6: error: '1,058.0' is not a number
    24 h,"1,058.0",1200
         ^
    write digits with a decimal point, without marks for thousands
)");
    }
    SECTION("a unit in the cell") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,8 mm,12 mm/h\n") ==
              R"(county.csv:2:7: error: '8 mm' is not a number
    5 min,8 mm,12 mm/h
          ^
    the unit stands once, in the header
county.csv:2:12: error: '12 mm/h' is not a number
    5 min,8 mm,12 mm/h
               ^
    the unit stands once, in the header
)");
    }
    SECTION("zero and less") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,0,-3\n") ==
              R"(county.csv:2:7: error: a value must be above zero, not 0
    5 min,0,-3
          ^
    leave out a duration or a return period that has no value
county.csv:2:9: error: a value must be above zero, not -3
    5 min,0,-3
            ^
    leave out a duration or a return period that has no value
)");
    }
    SECTION("out of range") {
        CHECK(table_problems("duration,2 yr [in],10 yr\n"
                             "5 min,8,1e308\n") ==
              R"(county.csv:2:9: error: '1e308' is out of range
    5 min,8,1e308
            ^
    check its digits and the unit of the table
)");
    }
    SECTION("an open quote") {
        CHECK(table_problems("duration,2 yr [mm],10 yr\n"
                             "5 min,\"8,12\n") ==
              R"(county.csv:2:7: error: the quote that opens here is not closed on this line
    5 min,"8,12
          ^
    a cell in quotes ends with a quote; a quote inside it is doubled
)");
    }
}

TEST_CASE("depths that fall are errors at the cell") {
    SECTION("with duration") {
        CHECK(
            table_problems("duration,2 yr [mm],10 yr\n"
                           "5 min,8,12.5\n"
                           "10 min,8,12\n") ==
            R"(county.csv:3:10: error: depth falls with duration: 12 mm over 10 min is less rain than 12.5 mm over 5 min
    10 min,8,12
             ^
    a longer duration holds the shorter one; check both values
)");
    }
    SECTION("with duration, as intensity") {
        CHECK(
            table_problems("duration,2 yr [in/h],10 yr\n"
                           "12 h,0.2,0.3\n"
                           "24 h,0.1,0.1\n") ==
            R"(county.csv:3:10: error: depth falls with duration: 0.1 in/h over 24 h is less rain than 0.3 in/h over 12 h
    24 h,0.1,0.1
             ^
    check both values; intensities of few digits can do this, so take a table of depths where there is one
)");
    }
    SECTION("with return period") {
        CHECK(
            table_problems("duration,2 yr [mm],10 yr,25 yr\n"
                           "5 min,8,12,11.9\n") ==
            R"(county.csv:2:12: error: depth falls with return period: 11.9 mm for 25 yr is less than 12 mm for 10 yr
    5 min,8,12,11.9
               ^
    rarer rain is deeper; check both values
)");
    }
    SECTION("across a cell that cannot be read") {
        CHECK(table_problems("duration,2 yr [mm],10 yr,25 yr\n"
                             "5 min,8,x,7\n"
                             "10 min,9,7,7.5\n") ==
              R"(county.csv:2:9: error: 'x' is not a number
    5 min,8,x,7
            ^
    give a value to each column of the header; leave out a duration that lacks one
county.csv:3:10: error: depth falls with return period: 7 mm for 10 yr is less than 9 mm for 2 yr
    10 min,9,7,7.5
             ^
    rarer rain is deeper; check both values
)");
    }
}

TEST_CASE("twenty errors are listed, the others counted") {
    std::string text = "duration,2 yr [mm],10 yr\n";
    for (int i = 1; i <= 25; ++i)
        text += std::to_string(i) + " min,x,12\n";
    const std::string problems = table_problems(text);
    CHECK_THAT(problems, Contains("county.csv:21:8: error: 'x' is not a number\n"));
    CHECK_THAT(problems, !Contains("county.csv:22:"));
    CHECK_THAT(problems, Contains("county.csv: error: and 5 more errors\n"));
}

}  // namespace rainledger
