#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("what may be a slip is warned of, and read") {
    SECTION("long steps") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "10,1\n"
                          "30,1\n"
                          "35,1\n"
                          "40,1\n"
                          "45,1\n"
                          "50,1\n",
                          layout) ==
              R"(gauge.csv:4:1: warning: this step lasts 20 min, over three times the usual 5 min
    30,1
    ^
    if rows are missing here, state how long each row covers with every:
)");
    }
    SECTION("long stamped step") {
        CsvLayout layout;
        CHECK(problems_in("depth [mm];end\n"
                          "1;2026-03-04T10:05Z\n"
                          "1;2026-03-04T10:10Z\n"
                          "1;2026-03-04T10:15Z\n"
                          "1;2026-03-04T12:00Z\n",
                          layout) ==
              R"(gauge.csv:5:3: warning: this step lasts 105 min, over three times the usual 5 min
    1;2026-03-04T12:00Z
      ^
    if rows are missing here, state how long each row covers with every:
)");
    }
    SECTION("first reading") {
        CsvLayout layout;
        CHECK(
            problems_in("end,cumulative [mm]\n"
                        "2026-03-04T10:05,120.4\n"
                        "2026-03-04T10:10,120.6\n"
                        "2026-03-04T10:15,121\n",
                        layout) ==
            R"(gauge.csv:2:18: warning: the first reading, 120.4, counts from 0 and is larger than any rise after it
    2026-03-04T10:05,120.4
                     ^
    if the gauge had rain in it before, subtract that from every reading
)");
    }
    SECTION("zone without stamps") {
        CsvLayout layout;
        layout.zone = "Europe/Madrid";
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: warning: elapsed times have no use for the scenario's zone:
    end [min],depth [mm]
    ^
)");
    }
}

}  // namespace rainledger
