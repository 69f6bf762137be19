#include <string>
#include <vector>

#include "rain/statistics_helpers.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Numbers = std::vector<double>;

/// The form in which agencies publish, with invented numbers.
const std::string kAgencyTable =
    "Point precipitation frequency estimates (inches)\n"
    "Invented atlas, volume 3\n"
    "Data type: Precipitation depth\n"
    "Time series type: Partial duration\n"
    "Location name: Millbrook depot\n"
    "Latitude: 40.1 degrees\n"
    "Elevation: 320 ft\n"
    "\n"
    "\n"
    "PRECIPITATION FREQUENCY ESTIMATES\n"
    "by duration for ARI (years):, 1,2,5,10\n"
    "5-min:, 0.36,0.43,0.53,0.62\n"
    "60-min:, 1.02,1.24,1.60,1.91\n"
    "24-hr:, 2.23,2.67,3.34,3.91\n"
    "2-day:, 2.59,3.10,3.86,4.49\n"
    "\n"
    "\n"
    "PRECIPITATION FREQUENCY ESTIMATES, UPPER BOUND\n"
    "by duration for ARI (years):, 1,2,5,10\n"
    "5-min:, 0.40,0.47,0.59,0.68\n"
    "60-min:, 1.12,1.36,1.76,2.10\n"
    "\n"
    "PRECIPITATION FREQUENCY ESTIMATES, LOWER BOUND\n"
    "by duration for ARI (years):, 1,2,5,10\n"
    "5-min:, 0.33,0.39,0.48,0.56\n"
    "60-min:, 0.93,1.13,1.45,1.73\n"
    "\n"
    "Date/time (GMT):  Tue Mar  4 10:11:12 2031\n"
    "run time:  0.011\n";

std::string replaced(std::string text, const std::string& from, const std::string& to) {
    const std::size_t at = text.find(from);
    REQUIRE(at != std::string::npos);
    return text.replace(at, from.size(), to);
}

}  // namespace

TEST_CASE("the plain form: durations with units, return periods with the unit of depth") {
    const RainfallStatistics table = read_table(kCountyTable);
    CHECK(table.duration_h == Numbers{5.0 / 60.0, 10.0 / 60.0, 0.25, 0.5, 1, 2, 3, 6, 12, 24});
    CHECK(table.return_period_yr == Numbers{2, 5, 10, 25, 50, 100});
    CHECK(table.at(0, 2) == 12.5);
    CHECK(table.at(9, 5) == 131.1);
    CHECK(table.set_aside.empty());
}

TEST_CASE("the same table in other spellings") {
    const Numbers durations{5.0 / 60.0, 1.0};
    const Numbers depths{8.0, 12.0, 27.0, 41.0};
    for (const char* const text : {
             "duration [min],2 yr [mm],10 yr [mm]\n5,8,12\n60,27,41\n",
             "Duration (min),2-year (mm),10-year (mm)\n5,8,12\n60,27,41\n",
             "minutes,2 [mm],10\n5,8,12\n60,27,41\n",
             "depth [mm]\nduration,2,10\n5 min,8,12\n1 h,27,41\n",
             "Depths in millimetres\nduration,2 years,10 years\n5-min,8,12\n60-min,27,41\n",
             "depth [cm]\n[min],2 yr,10 yr\n5,0.8,1.2\n60,2.7,4.1\n",
             "duration [min];2 yr [mm];10 yr [mm]\n5;8,0;12\n1 h;27;41,0\n",
             "duration\t2 yr [mm]\t10 yr [mm]\n5 min:\t8\t12\n1-hr:\t27\t41\n",
             "\xEF\xBB\xBF"
             "duration [h],2 yr [mm],10 yr [mm]\r\n5 min,8,12\r\n1,27,41\r\n",
             "\"duration\",\"2 yr [mm]\",\"10 yr [mm]\"\n\"5 min\",\"8\",\"12\"\n1 hour,27,41\n",
             "intensity [mm/h]\nduration,2 yr,10 yr\n5 min,96,144\n1 h,27,41\n",
             "duration,2 yr [mm/hr],10 yr\n5 min,96,144\n1 h,27,41\n",
             "Rainfall intensities in millimetres per hour\n,2,10\n5 min,96,144\n1 h,27,41\n",
         }) {
        CAPTURE(text);
        const RainfallStatistics table = read_table(text);
        CHECK(table.duration_h == durations);
        CHECK(table.return_period_yr == Numbers{2, 10});
        REQUIRE(table.depth_mm.size() == depths.size());
        for (std::size_t i = 0; i < depths.size(); ++i)
            CHECK_THAT(table.depth_mm[i], WithinRel(depths[i], 1e-15));
    }
}

TEST_CASE("a table of one return period, and one without any") {
    const RainfallStatistics one = read_table("duration,10 yr [mm]\n5 min,12.5\n1 h,41\n");
    CHECK(one.return_period_yr == Numbers{10});
    CHECK(one.depth_mm == Numbers{12.5, 41});
    const RainfallStatistics bare = read_table("depth [mm]\nduration,10\n5 min,12.5\n1 h,41\n");
    CHECK(bare.return_period_yr == Numbers{10});
    for (const char* const text :
         {"duration [min],depth [mm]\n5,12.5\n60,41\n", "duration,rain [mm]\n5 min,12.5\n1 h,41\n",
          "duration [min],intensity [mm/h]\n5,150\n60,41\n"}) {
        CAPTURE(text);
        const RainfallStatistics list = read_table(text);
        CHECK(list.return_period_yr.empty());
        CHECK(list.depth_mm == Numbers{12.5, 41});
        CHECK(list.at(1, 0) == 41);
    }
}

TEST_CASE("equal depths are no error, nor is a rounding of the conversion") {
    const RainfallStatistics table = read_table(
        "duration [min],2 yr [mm/h],5 yr\n10,72,72\n15,48,48.3\n21,34.2857142857142,34.5\n");
    CHECK(table.at(0, 0) == table.at(0, 1));
    CHECK(table.at(1, 0) >= table.at(0, 0));
    CHECK(table.at(2, 0) >= table.at(1, 0));
}

TEST_CASE("a table as agencies publish it, limits of confidence set aside") {
    const RainfallStatistics table = read_table(kAgencyTable);
    CHECK(table.duration_h == Numbers{5.0 / 60.0, 1, 24, 48});
    CHECK(table.return_period_yr == Numbers{1, 2, 5, 10});
    CHECK_THAT(table.at(0, 0), WithinRel(0.36 * 25.4, 1e-15));
    CHECK_THAT(table.at(3, 3), WithinRel(4.49 * 25.4, 1e-15));
    CHECK(table.set_aside ==
          std::vector<std::string>{
              "a block headed 'PRECIPITATION FREQUENCY ESTIMATES, UPPER BOUND' at line 18",
              "a block headed 'PRECIPITATION FREQUENCY ESTIMATES, LOWER BOUND' at line 23"});
}

TEST_CASE("intensities as agencies publish them, the unit in a line of its own") {
    std::string text = replaced(kAgencyTable, "estimates (inches)", "estimates");
    text = replaced(text, "Precipitation depth", "Precipitation intensity\nUnits: inches/hour");
    text = replaced(text, "0.36,0.43,0.53,0.62", "4.36,5.22,6.43,7.41");
    text = replaced(text, "2.23,2.67,3.34,3.91", "0.093,0.111,0.139,0.163");
    text = replaced(text, "2.59,3.10,3.86,4.49", "0.054,0.064,0.080,0.094");
    const RainfallStatistics table = read_table(text);
    CHECK_THAT(table.at(0, 0), WithinRel(4.36 * 25.4 / 12.0, 1e-14));
    CHECK_THAT(table.at(2, 1), WithinRel(0.111 * 25.4 * 24.0, 1e-14));
}

TEST_CASE("other layouts of the same kind") {
    SECTION("limits first") {
        const RainfallStatistics table = read_table(
            "Values in mm\n"
            "Upper confidence limit\nduration,2 yr,10 yr\n5 min,9,14\n"
            "Estimates\nduration,2 yr,10 yr\n5 min,8,12\n"
            "Lower confidence limit\nduration,2 yr,10 yr\n5 min,7,10\n");
        CHECK(table.depth_mm == Numbers{8, 12});
        CHECK(table.set_aside ==
              std::vector<std::string>{"a block headed 'Upper confidence limit' at line 2",
                                       "a block headed 'Lower confidence limit' at line 8"});
    }
    SECTION("limits without a row of return periods of their own") {
        const RainfallStatistics table =
            read_table("duration,2 yr [mm],10 yr [mm]\n5 min,8,12\nupper\n5 min,9,14\n");
        CHECK(table.depth_mm == Numbers{8, 12});
        CHECK(table.set_aside == std::vector<std::string>{"a block headed 'upper' at line 3"});
    }
    SECTION("a further block without a heading") {
        const RainfallStatistics table = read_table(
            "duration,2 yr [mm],10 yr [mm]\n5 min,8,12\n\nduration,2 yr [mm],10 yr [mm]\n5 min,9,"
            "14\n");
        CHECK(table.depth_mm == Numbers{8, 12});
        CHECK(table.set_aside == std::vector<std::string>{"a block without a heading at line 4"});
    }
    SECTION("the unit in the heading of the block that is taken") {
        const RainfallStatistics table = read_table(
            "Upper confidence limit\nyears:,2,10\n5 min,9,14\n"
            "Estimates (cm)\nyears:,2,10\n5 min,0.8,1.2\n");
        CHECK(table.depth_mm == Numbers{8, 12});
    }
    SECTION("a place named after its lower half, and a position that is no row of years") {
        const RainfallStatistics table = read_table(
            "Depths in mm\nPosition, 40.5, 75.2\nLower Millbrook\n"
            "duration,2 yr,10 yr\n5 min,8,12\n");
        CHECK(table.depth_mm == Numbers{8, 12});
        CHECK(table.set_aside.empty());
    }
    SECTION("a row of units between the header and the rows") {
        for (const std::string units : {",mm,mm", "min,[mm],[mm]", "Minutes,Depth (mm),mm"}) {
            const RainfallStatistics table =
                read_table("duration,2 yr,10 yr\n" + units + "\n5 min,8,12\n1 h,27,41\n");
            CHECK(table.depth_mm == Numbers{8, 12, 27, 41});
        }
        const RainfallStatistics bare =
            read_table("T,2,10\nmin,in/hr,in/hr\n5,3.6,4.8\n60,1,1.5\n");
        CHECK(bare.duration_h.back() == 1.0);
        CHECK_THAT(bare.at(0, 0), WithinRel(0.3 * 25.4, 1e-15));
    }
    SECTION("a header of two rows, as merged cells are exported") {
        const RainfallStatistics table = read_table(
            "Duration,Depth (mm) for a return period of,\n,2 years,10 years\n5 min,8,12\n");
        CHECK(table.return_period_yr == Numbers{2, 10});
        CHECK(table.depth_mm == Numbers{8, 12});
    }
    SECTION("one list under its unit alone") {
        const RainfallStatistics table = read_table("duration [min],mm\n5,8\n60,27\n");
        CHECK(table.return_period_yr.empty());
        CHECK(table.depth_mm == Numbers{8, 27});
    }
    SECTION("cells left empty by a spreadsheet") {
        const RainfallStatistics table = read_table(
            "Depths in mm,,,\n,,,\nduration,2 yr,10 yr,\n5 min,8,12,\n1 h,27,41,\nend of "
            "table,,,\n");
        CHECK(table.depth_mm == Numbers{8, 12, 27, 41});
    }
    SECTION("heights and distances are no units of rain, and 'in' is a word") {
        const RainfallStatistics table = read_table(
            "Gauge in Millbrook, 320 ft above the sea, 12 m from the depot\nRain (in)\n"
            "duration,2 yr,10 yr\n5 min,0.5,1\n");
        CHECK_THAT(table.at(0, 1), WithinRel(25.4, 1e-15));
    }
}

TEST_CASE("what looks like a table of statistics, and what is rain") {
    CHECK(looks_like_statistics(kCountyTable));
    CHECK(looks_like_statistics(kAgencyTable));
    CHECK(looks_like_statistics("duration [min],depth [mm]\n5,12.5\n"));
    CHECK(looks_like_statistics("duration;2 yr;10 yr\n"));
    CHECK(looks_like_statistics("5 min,8.2,12.5\n10 min,12.5,19\n"));
    CHECK(looks_like_statistics("Return period,5 min,1 h\n2,8,27\n"));
    CHECK_FALSE(looks_like_statistics(""));
    CHECK_FALSE(looks_like_statistics("end [min],depth [mm]\n5,0.4\n10,1.1\n"));
    CHECK_FALSE(looks_like_statistics("start [h],end [h],intensity [mm/h]\n0,0.5,12\n0.5,1,3\n"));
    CHECK_FALSE(looks_like_statistics("start [h],end [h],depth [mm]\n0,1,12\n1,2,3\n"));
    CHECK_FALSE(looks_like_statistics("start [min],end [min],depth [mm]\n-5,10,12\n10,20,3\n"));
    CHECK_FALSE(looks_like_statistics("time,rain [mm]\n2031-03-04T10:05,1.2\n"));
    CHECK_FALSE(looks_like_statistics("time\n2031-03-04 10:05:17\n2031-03-04 10:07:41\n"));
    CHECK_FALSE(looks_like_statistics(
        "# logger 7, Quarry Row\ntime,tips,battery [V]\n2031-03-04 10:05:17,1,12.6\n"));
    CHECK_FALSE(looks_like_statistics("time,count\n2031-03-04 10:05:17,1\n"));
    CHECK_FALSE(looks_like_statistics("Tip,Date,Time\n1,2031-03-04,10:05:17\n"));
}

}  // namespace rainledger
