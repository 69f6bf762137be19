#include "rainledger/base/number.hpp"

#include "test.hpp"

namespace rainledger {

TEST_CASE("a number is read whole or not at all") {
    CHECK(parse_number("12.5") == 12.5);
    CHECK(parse_number("+3") == 3.0);
    CHECK(parse_number("-0.5e-3") == -0.5e-3);
    for (const char* bad : {"", " 1", "1 ", "1.5mm", "inf", "nan", "0x10", "1e999", "+-1", "--1",
                            "++1", "1,5", "1_000"})
        CHECK_FALSE(parse_number(bad));
}

TEST_CASE("numbers are written shortest for programs and fixed for people") {
    CHECK(shortest(0.1) == "0.1");
    CHECK(shortest(48.0) == "48");
    CHECK(parse_number(shortest(1.0 / 3.0)) == 1.0 / 3.0);
    CHECK(fixed(12.345, 1) == "12.3");
    CHECK(fixed(-0.04, 1) == "0.0");
    CHECK(fixed(-0.06, 1) == "-0.1");
    CHECK(three_figures(342.4) == "342");
    CHECK(three_figures(34.24) == "34.2");
    CHECK(three_figures(9.999) == "10.0");
    CHECK(three_figures(0.3421) == "0.342");
    CHECK(three_figures(0.9996) == "1.00");
    CHECK(three_figures(999.6) == "1000");
    CHECK(three_figures(12345.0) == "12300");
    CHECK(three_figures(1184000.0) == "1180000");
    CHECK(three_figures(0.02534) == "0.0253");
    CHECK(three_figures(0.0000012) == "0.000001");
    CHECK(three_figures(0.0) == "0");
    CHECK(three_figures(-4.217) == "-4.22");
}

}  // namespace rainledger
