#define CATCH_CONFIG_ENABLE_BENCHMARKING
#include <cstddef>
#include <cstdint>
#include <string>
#include <utility>
#include <vector>

#include <catch2/catch.hpp>

#include "rain/synthetic_logger.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"

// Time to read gauge records of a million rows and to find their events.
namespace rainledger {
namespace {

constexpr int kRows = 1'000'000;

std::string stamped_rows(const std::string& header, bool with_depth) {
    std::string out = header;
    for (int i = 1; i <= kRows; ++i) {
        out += stamp_of(1'924'992'000 + std::int64_t{300} * i);
        if (with_depth) {
            out += ',';
            append_shortest(out, 0.2 * (i % 7));
        }
        out += '\n';
    }
    return out;
}

std::string elapsed_rows() {
    std::string out = "end [min],depth [mm]\n";
    for (int i = 1; i <= kRows; ++i) {
        append_shortest(out, 5.0 * i);
        out += ',';
        append_shortest(out, 0.2 * (i % 7));
        out += '\n';
    }
    return out;
}

std::optional<GaugeRecord> read(std::string text, const RecordLayout& layout) {
    Diagnostics diagnostics;
    return read_gauge_record("logger.csv", std::move(text), layout, diagnostics);
}

void bench_reading(const std::string& name, const std::string& text, const RecordLayout& layout) {
    BENCHMARK_ADVANCED(std::string(name))(Catch::Benchmark::Chronometer meter) {
        // The reader takes the text over: each run has a copy made before the clock starts.
        std::vector<std::string> copies(static_cast<std::size_t>(meter.runs()), text);
        meter.measure([&](int run) {
            return read(std::move(copies[static_cast<std::size_t>(run)]), layout)->notes.rows;
        });
    };
}

}  // namespace

TEST_CASE("gauge records of a million rows") {
    RecordLayout tips;
    tips.tip_mm = 0.2;
    const std::string log = stamped_rows("time\n", false);
    bench_reading("read a million tips", log, tips);
    bench_reading("read a million stamped depths", stamped_rows("end,depth [mm]\n", true), {});
    bench_reading("read a million elapsed depths", elapsed_rows(), {});
    const auto record = read(log, tips);
    BENCHMARK("find the events of a million tips") {
        return find_events(*record, {6.0, 1.0}, {}).events.size();
    };
}

}  // namespace rainledger
