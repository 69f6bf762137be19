#include "rainledger/base/quantity.hpp"

#include <string>

#include "test.hpp"

namespace rainledger {
namespace {

double read(const std::string& text, Dimension dimension) {
    const ParsedQuantity parsed = parse_quantity(text, dimension);
    INFO(text << ": " << parsed.problem);
    REQUIRE(parsed.value);
    return *parsed.value;
}

}  // namespace

TEST_CASE("every unit of every dimension is converted by its definition") {
    CHECK(read("12.5 mm", Dimension::depth) == 12.5);
    CHECK(read("2 cm", Dimension::depth) == 20.0);
    CHECK(read("0.048 m", Dimension::depth) == 48.0);
    CHECK(read("0.5in", Dimension::depth) == 12.7);
    CHECK(read("1 ft", Dimension::depth) == 304.8);
    CHECK(read("3.4 mm/h", Dimension::rate) == 3.4);
    CHECK(read("1 in/hr", Dimension::rate) == 25.4);
    CHECK(read("1 in/h", Dimension::rate) == 25.4);
    CHECK(read("1 um/s", Dimension::rate) == 3.6);
    CHECK(read("1 mm/min", Dimension::rate) == 60.0);
    CHECK(read("1 cm/s", Dimension::rate) == 36000.0);
    CHECK(read("24 mm/d", Dimension::rate) == 1.0);
    CHECK(read("15 min", Dimension::time) == 0.25);
    CHECK(read("5 min", Dimension::time) == 5.0 / 60.0);
    CHECK(read("90 s", Dimension::time) == 0.025);
    CHECK(read("1 d", Dimension::time) == 24.0);
    CHECK(read("2 hr", Dimension::time) == 2.0);
    CHECK(read("0.069 1/min", Dimension::decay) == 0.069 * 60.0);
    CHECK(read("0.00115 1/s", Dimension::decay) == 0.00115 * 3600.0);
    CHECK(read("12 1/d", Dimension::decay) == 0.5);
    CHECK(read("0.42 ha", Dimension::area) == 4200.0);
    CHECK_THAT(read("0.6 ac", Dimension::area), WithinRel(2428.11385344, 1e-15));
    CHECK_THAT(read("1 mi2", Dimension::area), WithinRel(2589988.110336, 1e-15));
    CHECK(read("1 km2", Dimension::area) == 1.0e6);
    CHECK(read("1 ft2", Dimension::area) == 0.09290304);
    CHECK(read("500 L", Dimension::volume) == 0.5);
    CHECK(read("250 mL", Dimension::volume) == 0.00025);
    CHECK_THAT(read("1 ac-ft", Dimension::volume), WithinRel(1233.48183754752, 1e-15));
    CHECK(read("1 gal", Dimension::volume) == 0.003785411784);
    CHECK(read("1 m3/s", Dimension::discharge) == 1000.0);
    CHECK_THAT(read("1 cfs", Dimension::discharge), WithinRel(28.316846592, 1e-15));
    CHECK_THAT(read("1 gpm", Dimension::discharge), WithinRel(0.0630901964, 1e-9));
    CHECK_THAT(read("1 kPa", Dimension::suction), WithinRel(1000.0 / 9.80665, 1e-15));
    CHECK(read("11 cm", Dimension::suction) == 110.0);
    CHECK_THAT(read("1 cm/min^0.5", Dimension::sorptivity), WithinRel(77.4596669241483, 1e-14));
    CHECK(read("1 in/h^0.5", Dimension::sorptivity) == 25.4);
    CHECK(read("10 yr", Dimension::frequency) == 10.0);
}

TEST_CASE("a quantity without its unit, or with another's, is refused with what to write") {
    ParsedQuantity bare = parse_quantity("12.5", Dimension::depth);
    CHECK_FALSE(bare.value);
    CHECK(bare.problem == "'12.5' has no unit");
    CHECK(bare.hint == "write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)");
    CHECK(parse_quantity("12.5 mm/h", Dimension::depth).problem == "'mm/h' is not a unit of depth");
    CHECK(parse_quantity("lots", Dimension::rate).problem == "'lots' is not a rate");
    CHECK(parse_quantity("1e400 mm", Dimension::depth).problem == "'1e400 mm' is not a depth");
    CHECK(parse_quantity("1e307 m", Dimension::depth).problem == "'1e307 m' is too large a number");
    CHECK(parse_quantity("nan mm", Dimension::depth).problem == "'nan mm' is not a depth");
}

TEST_CASE("other spellings of a unit are not taken, but name the one that was meant") {
    const auto hint = [](const std::string& unit, Dimension dimension) {
        const ParsedQuantity parsed = parse_quantity("3 " + unit, dimension);
        CHECK_FALSE(parsed.value);
        CHECK(parsed.problem ==
              "'" + unit + "' is not a unit of " + std::string(dimension_name(dimension)));
        const std::string end = " (units: " + std::string(accepted_units(dimension)) + ")";
        INFO(unit << ": " << parsed.hint);
        REQUIRE(parsed.hint.ends_with(end));
        return parsed.hint.substr(0, parsed.hint.size() - end.size());
    };
    CHECK(parse_quantity("3 sqm", Dimension::area).hint ==
          "did you mean 'm2'? (units: m2, ha, km2, ft2, ac, mi2)");
    for (const char* unit : {"m\xC2\xB2", "m^2", "sqm", "sq m", "square metres", "M2"})
        CHECK(hint(unit, Dimension::area) == "did you mean 'm2'?");
    for (const char* unit : {"acres", "acre", "Ac."})
        CHECK(hint(unit, Dimension::area) == "did you mean 'ac'?");
    CHECK(hint("hectares", Dimension::area) == "did you mean 'ha'?");
    CHECK(hint("sq ft", Dimension::area) == "did you mean 'ft2'?");
    for (const char* unit : {"inches", "inch", "in.", "\""})
        CHECK(hint(unit, Dimension::depth) == "did you mean 'in'?");
    CHECK(hint("feet", Dimension::depth) == "did you mean 'ft'?");
    CHECK(hint("MM", Dimension::depth) == "did you mean 'mm'?");
    for (const char* unit : {"minutes", "mins", "min."})
        CHECK(hint(unit, Dimension::time) == "did you mean 'min'?");
    for (const char* unit : {"hours", "hrs", "hour"})
        CHECK(hint(unit, Dimension::time) == "did you mean 'h'?");
    for (const char* unit : {"mm/hour", "mm / hours", "mm per hour", "mm h-1", "mm h^-1",
                             "mm h\xE2\x81\xBB\xC2\xB9", "mm/hrs", "mmph"})
        CHECK(hint(unit, Dimension::rate) == "did you mean 'mm/h'?");
    CHECK(hint("mm/hr.", Dimension::rate) == "did you mean 'mm/hr'?");
    CHECK(hint("in/hour", Dimension::rate) == "did you mean 'in/h'?");
    CHECK(hint("\xC2\xB5m/s", Dimension::rate) == "did you mean 'um/s'?");
    for (const char* unit : {"/h", "h-1", "h^-1", "per hour"})
        CHECK(hint(unit, Dimension::decay) == "did you mean '1/h'?");
    CHECK(hint("1/minute", Dimension::decay) == "did you mean '1/min'?");
    for (const char* unit : {"mm/sqrt(h)", "mm/\xE2\x88\x9Ah", "mm/h^(1/2)", "mm/hr^0.5"})
        CHECK(hint(unit, Dimension::sorptivity) == "did you mean 'mm/h^0.5'?");
    CHECK(hint("l/s", Dimension::discharge) == "did you mean 'L/s'?");
    CHECK(hint("lps", Dimension::discharge) == "did you mean 'L/s'?");
    CHECK(hint("m3/sec", Dimension::discharge) == "did you mean 'm3/s'?");
    CHECK(hint("ft^3/s", Dimension::discharge) == "did you mean 'ft3/s'?");
    CHECK(hint("CFS", Dimension::discharge) == "did you mean 'cfs'?");
    CHECK(hint("ml", Dimension::volume) == "did you mean 'mL'?");
    CHECK(hint("cm3", Dimension::volume) == "did you mean 'mL'?");
    CHECK(hint("acre-feet", Dimension::volume) == "did you mean 'ac-ft'?");
    CHECK(hint("cubic meters", Dimension::volume) == "did you mean 'm3'?");
    CHECK(hint("kpa", Dimension::suction) == "did you mean 'kPa'?");
    CHECK(hint("years", Dimension::frequency) == "did you mean 'yr'?");
    CHECK(parse_quantity("3 mm", Dimension::area).hint ==
          "write a number with a unit, such as '0.42 ha' (units: m2, ha, km2, ft2, ac, mi2)");
}

TEST_CASE("decimal commas and marks for thousands are named as such") {
    const std::string hint = "write a decimal point, and no mark for thousands";
    for (const std::string text : {"4,800 m2", "0,48 m2", "4 800 m2", "4'800 m2"}) {
        const ParsedQuantity parsed = parse_quantity(text, Dimension::area);
        CHECK(parsed.problem == "'" + text + "' is not one number");
        CHECK(parsed.hint == hint);
    }
    CHECK(parse_bare_number("0,2").problem == "'0,2' is not one number");
    CHECK(parse_bare_number("0,2").hint == hint);
}

TEST_CASE("a time on a clock is given with its unit") {
    for (const char* text : {"0:10", "00:10", "00:10:00", " 0:10 "}) {
        const ParsedQuantity parsed = parse_quantity(text, Dimension::time);
        CHECK(parsed.problem == "'" + std::string(text) + "' is not a time");
        CHECK(parsed.hint == "write '10 min'");
    }
    CHECK(parse_quantity("1:30", Dimension::time).hint == "write '90 min'");
    CHECK(parse_quantity("0:00:30", Dimension::time).hint == "write '30 s'");
    const std::string usual =
        "write a number with a unit, such as '15 min' (units: s, min, h, hr, d)";
    for (const char* text : {"0:", ":10", "0:1:2:3", "0:x", ":", "-0:10"})
        CHECK(parse_quantity(text, Dimension::time).hint == usual);
    CHECK(parse_quantity(std::string(500, '9') + ":00", Dimension::time).hint == usual);
}

TEST_CASE("a long value is cut short in a message, at a whole character") {
    std::string dots(59, '.');
    CHECK(parse_quantity(dots + "\xC3\xA9" + std::string(1000, 'x'), Dimension::depth).problem ==
          "'" + dots + "\xC3\xA9...' is not a depth");
    CHECK(parse_quantity("3 " + std::string(61, 'y'), Dimension::depth).problem ==
          "'" + std::string(60, 'y') + "...' is not a unit of depth");
    CHECK(parse_quantity("3 " + std::string(60, 'y'), Dimension::depth).problem ==
          "'" + std::string(60, 'y') + "' is not a unit of depth");
}

TEST_CASE("shares take fractions and percentages, bare numbers take no unit") {
    CHECK(parse_share("0.4").value == 0.4);
    CHECK(parse_share("40 %").value == 0.4);
    CHECK(parse_share("40%").value == 0.4);
    CHECK_FALSE(parse_share("40 mm").value);
    CHECK(parse_bare_number("89").value == 89.0);
    CHECK(parse_bare_number("89 mm").problem == "'89 mm' has a unit where a plain number belongs");
    CHECK(parse_bare_number("x").problem == "'x' is not a number");
}

}  // namespace rainledger
