#define CATCH_CONFIG_ENABLE_BENCHMARKING
#include <charconv>
#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include <catch2/catch.hpp>

#include "rainledger/base/number.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

// Time to read a hyetograph of a million rows, with every check, beside a bare from_chars loop over
// the same bytes that checks nothing.
namespace rainledger {
namespace {

constexpr int kRows = 1000000;

std::string elapsed_file() {
    std::string out = "end [min],depth [mm]\n";
    for (int i = 1; i <= kRows; ++i) {
        append_shortest(out, 5.0 * i);
        out += ',';
        append_shortest(out, 0.1 * (i % 37));
        out += '\n';
    }
    return out;
}

std::size_t bare_loop(const std::string& text) {
    std::vector<double> times;
    std::vector<double> depths;
    const char* at = text.data() + text.find('\n') + 1;
    const char* const end = text.data() + text.size();
    while (at < end) {
        double value = 0.0;
        at = std::from_chars(at, end, value).ptr + 1;
        times.push_back(value);
        at = std::from_chars(at, end, value).ptr + 1;
        depths.push_back(value);
    }
    return times.size() + depths.size();
}

}  // namespace

TEST_CASE("a million rows of elapsed time and depth") {
    const std::string text = elapsed_file();
    BENCHMARK_ADVANCED("read_hyetograph_csv")(Catch::Benchmark::Chronometer meter) {
        // The reader takes the text over: each run has a copy made before the clock starts.
        std::vector<std::string> copies(static_cast<std::size_t>(meter.runs()), text);
        meter.measure([&](int run) {
            Diagnostics diagnostics;
            return read_hyetograph_csv("rain.csv", std::move(copies[static_cast<std::size_t>(run)]),
                                       {}, diagnostics)
                ->steps();
        });
    };
    BENCHMARK("bare from_chars loop") {
        return bare_loop(text);
    };
}

}  // namespace rainledger
