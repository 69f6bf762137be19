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
    CHECK(parse_quantity("1,5 mm", Dimension::depth).problem == "',5 mm' is not a unit of depth");
    CHECK(parse_quantity("1e400 mm", Dimension::depth).problem == "'1e400 mm' is not a depth");
    CHECK(parse_quantity("1e307 m", Dimension::depth).problem == "'1e307 m' is too large a number");
    CHECK(parse_quantity("nan mm", Dimension::depth).problem == "'nan mm' is not a depth");
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
