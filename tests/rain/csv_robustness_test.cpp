#include <algorithm>
#include <array>
#include <cmath>
#include <numeric>
#include <random>
#include <vector>

#include "rain/csv_helpers.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

void check_invariants(const Hyetograph& rain) {
    const std::size_t steps = rain.steps();
    REQUIRE(steps > 0);
    REQUIRE(rain.own_steps == steps);
    REQUIRE(rain.edges_h.size() == steps + 1);
    REQUIRE(rain.duration_h.size() == steps);
    REQUIRE(rain.given.has_value() != rain.stamps.has_value());
    if (rain.given) REQUIRE(rain.given->value.size() == steps + 1);
    if (rain.stamps) REQUIRE(rain.stamps->unix_ms.size() == steps + 1);
    if (rain.stamps) REQUIRE(rain.stamps->offset_minutes.size() == steps + 1);
    for (std::size_t i = 0; i < steps; ++i) {
        REQUIRE(rain.depth_mm[i] >= 0.0);
        REQUIRE(rain.depth_mm[i] <= 1e12);
        REQUIRE(rain.intensity_mm_per_h(i) <= 1e12 * (1.0 + 1e-15));
        REQUIRE(rain.duration_h[i] > 0.9999 / 3.6e6);
        REQUIRE(std::abs(rain.edges_h[i + 1]) <= 1e12);
        REQUIRE(rain.edges_h[i + 1] > rain.edges_h[i]);
    }
}

std::string mutated(std::string text, std::mt19937& random) {
    constexpr std::string_view kTelling = "0123456789.,;\t\n\r\" -+eE:TZ#[]nai\xEF\xBB\xBF\xFF";
    const auto below = [&](std::size_t n) {
        return std::uniform_int_distribution<std::size_t>(0, n - 1)(random);
    };
    for (std::size_t edits = 1 + below(2); edits > 0 && !text.empty(); --edits) {
        const std::size_t place = below(text.size());
        const char c =
            below(8) == 0 ? static_cast<char>(below(256)) : kTelling[below(kTelling.size())];
        switch (below(4)) {
            case 0:
                text[place] = c;
                break;
            case 1:
                text.insert(place, 1, c);
                break;
            case 2:
                text.erase(place, 1 + below(2));
                break;
            default:
                text.insert(place, text.substr(below(text.size()), below(6)));
                break;
        }
    }
    return text;
}

/// A file of `rows` rows in order, with the decimal mark and separator given.
std::string long_file(int rows, char separator, char mark) {
    std::string text = std::string("end [min]") + separator + "depth [mm]\n";
    for (int i = 1; i <= rows; ++i) {
        std::string depth = fixed((i * 37 % 101) / 10.0, 1);
        depth[depth.find('.')] = mark;
        text += std::to_string(5 * i) + separator + depth + "\n";
    }
    return text;
}

}  // namespace

TEST_CASE("whatever bytes come, there is a sound hyetograph or an error") {
    constexpr std::array kSound{
        "end [min],depth [mm]\n5,0.4\n10,1.1\n15,0\n20,2.5\n",
        "start [min];end [min];intensity [mm/h]\n0;5;4,8\n5;10;13,2\n10;20;0\n",
        "# Millbrook depot\r\nend,cumulative [mm]\r\n2026-10-25 01:30,1\r\n2026-10-25 02:00,2\r\n"
        "2026-10-25 02:30,3\r\n2026-10-25 02:00,4\r\n",
        "start\tnote\tdepth [in]\n2026-03-04T10:05Z\t\"a \"\"b\"\"\"\t0.1\n"
        "2026-03-04T10:10Z\t\t0.2\n",
    };
    const unsigned seed = GENERATE(1U, 20260304U);
    CAPTURE(seed);
    std::mt19937 random(seed);
    std::size_t accepted = 0;
    for (std::size_t i = 0; i < 8000; ++i) {
        const std::string text = mutated(kSound[i % kSound.size()], random);
        CsvLayout layout;
        layout.gaps_are_dry = i % 3 == 0;
        if (i % 5 == 0) layout.zone = "Europe/Madrid";
        if (i % 7 == 0) layout.every_h = 5.0 / 60;
        if (i % 11 == 0) layout.missing = "0";
        CAPTURE(i, text);
        Diagnostics diagnostics;
        const auto rain = read_hyetograph_csv("gauge.csv", text, layout, diagnostics);
        REQUIRE(rain.has_value() != diagnostics.has_errors());
        for (const Diagnostic& diagnostic : diagnostics.list())
            REQUIRE_FALSE(render(diagnostic).empty());
        if (rain) check_invariants(*rain);
        accepted += rain ? 1U : 0U;
    }
    // Neither outcome may go untested.
    CHECK(accepted > 500);
    CHECK(accepted < 7500);
}

TEST_CASE("shuffled rows are refused") {
    const unsigned seed = GENERATE(3U, 5U, 8U);
    CAPTURE(seed);
    std::mt19937 random(seed);
    std::vector<int> order(40);
    std::iota(order.begin(), order.end(), 1);
    std::shuffle(order.begin(), order.end(), random);
    REQUIRE_FALSE(std::is_sorted(order.begin(), order.end()));
    for (const char* header : {"end [min],depth [mm]\n", "start [min],depth [mm]\n"}) {
        std::string text = header;
        for (const int row : order)
            text += std::to_string(5 * row) + ",1\n";
        CHECK_THAT(problems_in(text, {}), Contains("error: time goes back, from "));
    }
}

TEST_CASE("a long file reads the same whichever way its numbers are written") {
    const Hyetograph points = read_clean(long_file(3000, ',', '.'));
    check_invariants(points);
    const Hyetograph commas = read_clean(long_file(3000, ';', ','));
    CHECK(points.depth_mm == commas.depth_mm);
    CHECK(points.edges_h == commas.edges_h);
    CHECK(points.depth_mm[2998] == (2999 * 37 % 101) / 10.0);
    CHECK(points.given->value.back() == 15000.0);
}

TEST_CASE("a long cumulative file adds up, whatever is missing in it") {
    const auto rain_of = [](bool first_is_missing) {
        std::string text = "start [min],end [min],cumulative [mm]\n";
        for (int i = 0; i < 500; ++i) {
            const bool missing = i == 250 || (i == 0 && first_is_missing);
            text += std::to_string(5 * i) + "," + std::to_string(5 * i + 5) + ",";
            text += (missing ? "" : std::to_string(3 * i + 3)) + "\n";
        }
        CsvLayout layout;
        layout.gaps_are_dry = true;
        return read_clean(text, layout);
    };
    for (const bool first_is_missing : {false, true}) {
        const Hyetograph rain = rain_of(first_is_missing);
        check_invariants(rain);
        CHECK(total_depth_mm(rain) == 1500.0);
        CHECK(rain.depth_mm[250] == 0.0);
        CHECK(rain.depth_mm[251] == 6.0);
        CHECK(rain.depth_mm[1] == (first_is_missing ? 6.0 : 3.0));
    }
}

TEST_CASE("deep in a long file an odd row is read, and a bad one located") {
    const std::string text = long_file(1000, ',', '.');
    const std::size_t row = text.find("2500,");
    const auto with = [&](const char* line) {
        std::string out = text;
        return out.replace(row, out.find('\n', row) - row, line);
    };
    CHECK(read_clean(with("2500,9.5")).depth_mm[499] == 9.5);
    CHECK(read_clean(with("# a note\n\"2500\", +9.5 ")).depth_mm[499] == 9.5);
    CHECK(read_clean(with("2500,9.5\r")).depth_mm[499] == 9.5);
    const auto where = [&](const char* line) {
        const std::string out = problems_in(with(line), {});
        return out.substr(0, out.find('\n'));
    };
    CHECK(where("2500,-1") == "gauge.csv:501:6: error: rain cannot be negative");
    CHECK(where("2495,1") ==
          "gauge.csv:501:1: error: the time of the row above comes again, 2495 min");
    CHECK(where("2500,inf") == "gauge.csv:501:6: error: 'inf' is not a finite number");
    CHECK(where("2500,1,1") == "gauge.csv:501:7: error: this row has 3 cells, the header 2");
    CHECK(where("# away\n# away") == "");
    CsvLayout marked;
    marked.missing = "7.7";
    CHECK_THAT(problems_in(with("2500,7.7"), marked),
               Contains("gauge.csv:501:6: error: the rain is missing here, marked '7.7'"));
}

}  // namespace rainledger
