#pragma once

#include <algorithm>
#include <cmath>
#include <cstdint>
#include <random>
#include <string>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/hyetograph.hpp"

// A logger's year, invented: storms and drizzle as 0.2 mm tips, and what befalls a logger.
namespace rainledger {

/// The same numbers on every machine, which the distributions of the standard library are not.
class SeededNumbers {
public:
    explicit SeededNumbers(std::uint64_t seed) : engine_(seed) {}

    /// From 0 to before 1.
    double share() { return static_cast<double>(engine_() >> 11U) * 0x1p-53; }
    double between(double low, double high) { return low + (high - low) * share(); }
    /// Of exponential distribution.
    double waiting(double mean) { return -mean * std::log1p(-share()); }
    std::size_t below(std::size_t count) { return engine_() % count; }

private:
    std::mt19937_64 engine_;
};

/// The instants of a year of tips from 1 January 2031, in s since 1970, rising: about 110 spells of
/// rain, some of them storms, and single tips of dew between.
inline std::vector<std::int64_t> year_of_tips(std::uint64_t seed) {
    constexpr std::int64_t kStart_s = 1'924'992'000;
    constexpr double kYear_s = 365.0 * 86'400.0;
    SeededNumbers numbers(seed);
    std::vector<std::int64_t> tips;
    for (double at = numbers.waiting(2e5); at < kYear_s; at += numbers.waiting(2.8e5)) {
        const double kind = numbers.share();
        const double end = at + (kind < 0.3 ? 0.0 : numbers.between(1e3, 4e4));
        const double mean_s = kind < 0.5 ? 900.0 : (kind < 0.9 ? 300.0 : 40.0);
        do {
            tips.push_back(kStart_s + static_cast<std::int64_t>(at));
            at += numbers.waiting(mean_s);
        } while (at < end && at < kYear_s);
    }
    return tips;
}

/// "2031-06-14T13:45:07Z"
inline std::string stamp_of(std::int64_t seconds) {
    StampedEdges edge;
    edge.unix_ms = {seconds * 1000};
    edge.offset_minutes = {0};
    edge.has_offset = true;
    return iso_stamp(edge, 0);
}

/// What the tips look like as a file that had an eventful year, and what a reader is to find.
struct LoggerFile {
    std::string text;
    RecordNotes notes;
    std::vector<std::int64_t> unix_ms;  ///< of every tip that counts, in order
};

/// Writes tips as a logger's file: now and then a tip is written twice (and counts), the logger
/// restarts with a header, a download repeats the last rows, the clock is set back by two minutes;
/// at the end a line is cut short.
inline LoggerFile logger_file(const std::vector<std::int64_t>& tips, std::uint64_t seed) {
    SeededNumbers numbers(seed);
    LoggerFile file;
    file.text = "time,battery [V]\n";
    std::vector<std::string> rows;
    std::int64_t before = 0;
    const auto write = [&](std::int64_t second) {
        if (!rows.empty() && second == before) ++file.notes.same_instant;
        rows.push_back(stamp_of(second) + ",12." + std::to_string(numbers.below(10)) + "\n");
        file.text += rows.back();
        file.unix_ms.push_back(second * 1000);
        before = second;
    };
    for (const std::int64_t tip : tips) {
        const double chance = numbers.share();
        if (chance < 0.002) {
            file.text += "time,battery [V]\n";
            ++file.notes.repeated_headers;
        } else if (chance < 0.004 && rows.size() > 50 && tip > before) {
            const std::size_t repeated = 2 + numbers.below(40);
            const std::string first = rows[rows.size() - repeated].substr(0, 20);
            // An overlap begins behind the last row; a tip of the very same instant is news.
            if (first < stamp_of(before)) {
                for (std::size_t i = rows.size() - repeated; i < rows.size(); ++i)
                    file.text += rows[i];
                file.notes.repeated_rows += repeated;
            }
        } else if (chance < 0.005 && !rows.empty()) {
            ++file.notes.clock_set_back;
            write(before - 120);
        }
        write(std::max(tip, before));
        if (chance > 0.99) write(before);
    }
    file.text += "2031-12-31T2";
    file.notes.partial_last_line = true;
    file.notes.rows = rows.size();
    std::ranges::sort(file.unix_ms);
    return file;
}

}  // namespace rainledger
