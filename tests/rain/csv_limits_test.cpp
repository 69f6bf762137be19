#include <string>

#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("sizes beyond what can be computed with are refused") {
    SECTION("steps under 1 ms") {
        CHECK(problems_in("end [min],depth [mm]\n"
                          "1e-300,1\n"
                          "5,2\n",
                          {}) ==
              R"(gauge.csv:2:1: error: this step is shorter than 1 ms
    1e-300,1
    ^
    check the times and their unit
)");
        CHECK(problems_in("depth [mm],start [s],end [s]\n"
                          "1,0,1\n"
                          "1,1,1.0009\n",
                          {}) ==
              R"(gauge.csv:3:3: error: this step is shorter than 1 ms
    1,1,1.0009
      ^
    check the times and their unit
)");
    }
    SECTION("depths") {
        CHECK(
            problems_in("end [h],depth [m]\n"
                        "50000,1.001e9\n"
                        "50001,1e306\n",
                        {}) ==
            R"(gauge.csv:2:7: error: this rain is too large to compute with, over 1e12 mm or 1e12 mm/h
    50000,1.001e9
          ^
    check the number and its unit
gauge.csv:3:7: error: this rain is too large to compute with, over 1e12 mm or 1e12 mm/h
    50001,1e306
          ^
    check the number and its unit
)");
    }
    SECTION("intensities, below blank lines and a hole") {
        CsvLayout layout;
        layout.gaps_are_dry = true;
        CHECK(
            problems_in(";\n"
                        "start [min];end [min];intensity [mm/h]\n"
                        ";;\n"
                        "0;5;1\n"
                        "10;15;1,1e12\n",
                        layout) ==
            R"(gauge.csv:5:7: error: this rain is too large to compute with, over 1e12 mm or 1e12 mm/h
    10;15;1,1e12
          ^
    check the number and its unit
)");
    }
    SECTION("times") {
        CHECK(problems_in("start [d],end [d],depth [mm]\n"
                          "0,1e308,1\n",
                          {}) ==
              R"(gauge.csv:2:1: error: this time is too large to compute with, over 1e12 h
    0,1e308,1
    ^
    check the times and their unit
)");
    }
}

TEST_CASE("sizes at the limits are read") {
    CHECK(read_clean("end [h],intensity [mm/h]\n1,1e12\n").depth_mm[0] == 1e12);
    CHECK(read_clean("start [s],end [s],depth [mm]\n0.002,0.003,1\n").depth_mm[0] == 1.0);
    CHECK(read_clean("end,depth [mm]\n2026-03-04T10:05:00.001,1\n2026-03-04T10:05:00.002,1\n")
              .steps() == 2);
    CHECK(read_clean("end [h],depth [mm]\n1e12,1\n").edges_h[1] == 1e12);
}

TEST_CASE("a long file whose every step is too short is refused in moments") {
    std::string text = "end [s],depth [mm]\n";
    for (int i = 1; i <= 100000; ++i)
        text += std::to_string(i) + "e-5,0\n";
    CHECK_THAT(problems_in(text, {}), Catch::EndsWith("error: and 99980 more errors\n"));
}

TEST_CASE("a byte that is no text is told of by its name and place") {
    CHECK(problems_in(std::string("end [min],depth [mm]\n5,1\n1\0,1\n", 30), {}) ==
          R"(gauge.csv:3:2: error: there is a NUL byte here
    1?,1
     ^
    the file is damaged, or not plain text; save it anew as UTF-8
)");
    CHECK_THAT(problems_in(std::string("\0", 1), {}),
               Catch::StartsWith("gauge.csv:1:1: error: there is a NUL byte here\n"));
}

}  // namespace rainledger
