#include "rain/statistics_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a file without a row of return periods") {
    SECTION("empty") {
        CHECK(table_problems("") ==
              R"(county.csv:1:1: error: there is no row of return periods in this file
    a table begins with a row such as 'duration,2 yr [mm],10 yr [mm],100 yr [mm]', then one row per duration: '5 min,8.2,12.5,18.6'
)");
    }
    SECTION("rain") {
        CHECK(table_problems("end [min],depth [mm]\n"
                             "5,0.4\n") ==
              R"(county.csv:1:1: error: there is no row of return periods in this file
    end [min],depth [mm]
    ^
    a table begins with a row such as 'duration,2 yr [mm],10 yr [mm],100 yr [mm]', then one row per duration: '5 min,8.2,12.5,18.6'
)");
    }
    SECTION("rows alone") {
        CHECK(table_problems("5 min,8,12\n"
                             "1 h,27,41\n") ==
              R"(county.csv:1:1: error: there is no row of return periods in this file
    5 min,8,12
    ^
    a table begins with a row such as 'duration,2 yr [mm],10 yr [mm],100 yr [mm]', then one row per duration: '5 min,8.2,12.5,18.6'
)");
    }
    SECTION("a table turned round") {
        for (const std::string first : {"Return period [yr]", "", "T"}) {
            const std::string header = first + ",5 min,1-hr [mm]";
            CHECK(table_problems("Depths\n" + header + "\n2,8,27\n10,12,41\n") ==
                  "county.csv:2:1: error: durations stand across here, in place of return "
                  "periods\n    " +
                      header +
                      "\n    ^\n"
                      "    turn the table round: a row per duration, a column per return period\n");
        }
    }
    SECTION("UTF-16") {
        CHECK(table_problems("\xFF\xFE\x31") ==
              R"(county.csv:1:1: error: there is no row of return periods in this file
    ��1
    ^
    the file is UTF-16 text; save it as UTF-8
)");
    }
}

TEST_CASE("slips in the row of return periods") {
    SECTION("not a return period") {
        CHECK(table_problems("duration,2 yr [mm],often\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:20: error: 'often' is not a return period
    duration,2 yr [mm],often
                       ^
    write return periods in years: '10', '10 yr', '10-year'
)");
    }
    SECTION("a chance") {
        CHECK(table_problems("duration,50% [mm],10 yr [mm]\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:10: error: '50% [mm]' is not a return period
    duration,50% [mm],10 yr [mm]
             ^
    write it in years, which is one over the chance of a year: 10 % is '10 yr'
)");
    }
    SECTION("below one year") {
        CHECK(table_problems("duration,0.5 yr [mm],10 yr [mm]\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:10: error: a return period of 0.5 yr is below 1 yr
    duration,0.5 yr [mm],10 yr [mm]
             ^
    return periods are in years, from 1 on
)");
    }
    SECTION("not rising") {
        CHECK(table_problems("duration,10 yr [mm],2 yr [mm],2 yr [mm]\n"
                             "5 min,8,12,13\n") ==
              R"(county.csv:1:21: error: return periods must rise, but 2 yr comes after 10 yr
    duration,10 yr [mm],2 yr [mm],2 yr [mm]
                        ^
    write each return period once, the shortest first
county.csv:1:31: error: return periods must rise, but 2 yr comes after 10 yr
    duration,10 yr [mm],2 yr [mm],2 yr [mm]
                                  ^
    write each return period once, the shortest first
)");
    }
    SECTION("not rising, and so are the depths") {
        CHECK(table_problems("duration,10 yr [mm],2 yr [mm]\n"
                             "5 min,12,8\n") ==
              R"(county.csv:1:21: error: return periods must rise, but 2 yr comes after 10 yr
    duration,10 yr [mm],2 yr [mm]
                        ^
    write each return period once, the shortest first
)");
    }
    SECTION("an empty cell") {
        CHECK(table_problems("duration,2 yr [mm],,10 yr [mm]\n"
                             "5 min,8,9,12\n") ==
              R"(county.csv:1:20: error: the return period is missing here
    duration,2 yr [mm],,10 yr [mm]
                       ^
    write return periods in years: '10', '10 yr', '10-year'
)");
    }
    SECTION("an open quote") {
        CHECK(table_problems("duration,2 yr [mm],\"10 yr [mm]\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:20: error: the quote that opens here is not closed on this line
    duration,2 yr [mm],"10 yr [mm]
                       ^
    a cell in quotes ends with a quote; a quote inside it is doubled
county.csv:2:9: error: there are more values in this row than columns in the header
    5 min,8,12
            ^
    give a value to each column of the header, and no more
)");
    }
    SECTION("rows without a duration") {
        CHECK(table_problems("duration,2 yr [mm],10 yr [mm]\n"
                             "0:05,8,12\n") ==
              R"(county.csv:2:1: error: '0:05' is not a duration
    0:05,8,12
    ^
    write durations as '5 min', '60-min', '24-hr' or '2 d'
)");
    }
    SECTION("no rows") {
        CHECK(table_problems("duration,2 yr [mm],10 yr [mm]\n") ==
              R"(county.csv:1:1: error: there are no rows of depths below this one
    duration,2 yr [mm],10 yr [mm]
    ^
    write a row per duration: '5 min' and its depths
)");
    }
}

TEST_CASE("units that are missing, unknown or contradictory") {
    SECTION("none") {
        CHECK(table_problems("duration,2 yr,10 yr\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:1: error: the table does not say the unit of its values
    duration,2 yr,10 yr
    ^
    write it in the header, as in '10 yr [mm]', or in a line above it: 'depth [mm]', 'intensity [in/h]'
)");
    }
    SECTION("unknown") {
        CHECK(table_problems("duration,2 yr [furlong],10 yr\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:10: error: unit 'furlong' is neither one of depth nor of intensity
    duration,2 yr [furlong],10 yr
             ^
    units of depth: mm, cm, m, in, ft; of intensity: mm/h, in/h and others
)");
    }
    SECTION("two in the header") {
        CHECK(table_problems("duration,2 yr [mm],10 yr [in]\n"
                             "5 min,8,12\n") ==
              R"(county.csv:1:20: error: unit 'in' contradicts 'mm' in line 1
    duration,2 yr [mm],10 yr [in]
                       ^
    all the values of a table have one unit
)");
    }
    SECTION("two in the header, so that depths cannot be compared") {
        CHECK(table_problems("duration,2 yr [mm],10 yr [in]\n"
                             "5 min,8,0.5\n") ==
              R"(county.csv:1:20: error: unit 'in' contradicts 'mm' in line 1
    duration,2 yr [mm],10 yr [in]
                       ^
    all the values of a table have one unit
)");
    }
    SECTION("a row of units against the header") {
        CHECK(table_problems("duration,2 yr [mm],10 yr [mm]\n"
                             ",in,in\n"
                             "5 min,8,12\n") ==
              R"(county.csv:2:2: error: unit 'in' contradicts 'mm' in line 1
    ,in,in
     ^
    all the values of a table have one unit
)");
    }
    SECTION("header against text") {
        CHECK(table_problems("Depths in inches\n"
                             "duration,2 yr [mm],10 yr [mm]\n"
                             "5 min,8,12\n") ==
              R"(county.csv:2:10: error: unit 'mm' contradicts 'inches' in line 1
    duration,2 yr [mm],10 yr [mm]
             ^
    all the values of a table have one unit
)");
    }
    SECTION("two in the text") {
        CHECK(table_problems("Rain (inches)\n"
                             "converted to mm\n"
                             "duration,2 yr,10 yr\n"
                             "5 min,8,12\n") ==
              R"(county.csv:2:14: error: unit 'mm' contradicts 'inches' in line 1
    converted to mm
                 ^
    all the values of a table have one unit
)");
    }
    SECTION("depth for intensity") {
        CHECK(
            table_problems("Rainfall intensity\n"
                           "duration,2 yr [mm],10 yr\n"
                           "5 min,8,12\n") ==
            R"(county.csv:2:10: error: unit 'mm' is one of depth, but the table is said to hold intensity
    duration,2 yr [mm],10 yr
             ^
    write the unit that the values have, or the right word for them
)");
    }
    SECTION("intensity for depth") {
        CHECK(
            table_problems("Rainfall depths (in/hr)\n"
                           "duration,2 yr,10 yr\n"
                           "5 min,8,12\n") ==
            R"(county.csv:1:18: error: unit 'in/hr' is one of intensity, but the table is said to hold depth
    Rainfall depths (in/hr)
                     ^
    write the unit that the values have, or the right word for them
)");
    }
}

TEST_CASE("problems of the whole file") {
    SECTION("errors are collected") {
        CHECK(table_problems("duration,2 yr,5 yr,often\n"
                             "5 min,8,x,12\n"
                             "10,9,10,\n"
                             "ten,1,2,3\n") ==
              R"(county.csv:1:20: error: 'often' is not a return period
    duration,2 yr,5 yr,often
                       ^
    write return periods in years: '10', '10 yr', '10-year'
county.csv:1:1: error: the table does not say the unit of its values
    duration,2 yr,5 yr,often
    ^
    write it in the header, as in '10 yr [mm]', or in a line above it: 'depth [mm]', 'intensity [in/h]'
county.csv:2:9: error: 'x' is not a number
    5 min,8,x,12
            ^
    give a value to each column of the header; leave out a duration that lacks one
county.csv:3:1: error: duration '10' has no unit
    10,9,10,
    ^
    name it in the header, 'duration [min]', or in each row, '5 min'
county.csv:3:6: error: this row ends after 2 of 3 values
    10,9,10,
         ^
    give a value to each column of the header; leave out a duration that lacks one
county.csv:4:1: error: 'ten' is not a duration
    ten,1,2,3
    ^
    write durations as '5 min', '60-min', '24-hr' or '2 d'
)");
    }
    SECTION("blocks of confidence limits alone") {
        CHECK(
            table_problems("Values in mm\n"
                           "Upper confidence limit\n"
                           "years:,2,10\n"
                           "5 min,9,14\n"
                           "Lower confidence limit\n"
                           "years:,2,10\n"
                           "5 min,7,10\n") ==
            R"(county.csv:3:1: error: every block of this file is headed as one of confidence limits
    years:,2,10
    ^
    take out the blocks that are, and the heading of the one that is not
)");
    }
}

}  // namespace rainledger
