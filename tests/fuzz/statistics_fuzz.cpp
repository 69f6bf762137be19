#include <cmath>
#include <cstddef>
#include <cstdint>
#include <cstdlib>
#include <string>

#include "rainledger/rain/rainfall_statistics.hpp"

// Any bytes are either a table of statistics that keeps its rules, and looks like one, or at least
// one error.
namespace {

using rainledger::RainfallStatistics;

bool rises(const std::vector<double>& values, double least) {
    double before = least;
    for (std::size_t i = 0; i < values.size(); ++i) {
        if (!(i == 0 ? values[i] >= before : values[i] > before)) return false;
        if (!std::isfinite(values[i])) return false;
        before = values[i];
    }
    return true;
}

bool keeps_its_rules(const RainfallStatistics& table) {
    if (table.duration_h.empty() || !(table.duration_h.front() > 0.0)) return false;
    if (!rises(table.duration_h, 0.0) || !rises(table.return_period_yr, 1.0)) return false;
    if (table.depth_mm.size() != table.duration_h.size() * table.columns()) return false;
    for (std::size_t i = 0; i < table.duration_h.size(); ++i) {
        for (std::size_t j = 0; j < table.columns(); ++j) {
            const double depth_mm = table.at(i, j);
            if (!(depth_mm > 0.0) || !std::isfinite(depth_mm)) return false;
            if (i > 0 && depth_mm < table.at(i - 1, j)) return false;
            if (j > 0 && depth_mm < table.at(i, j - 1)) return false;
        }
    }
    return true;
}

/// Every column is found again, and its depths have its return period or a longer one.
bool answers(const RainfallStatistics& table) {
    for (std::size_t j = 0; j < table.return_period_yr.size(); ++j) {
        const double years = table.return_period_yr[j];
        const auto column = depths_of(table, years);
        if (!column.list) return false;
        const auto rarity =
            rarity_of(table, table.duration_h.front(), column.list->depth_mm.front());
        if (!rarity || !rarity->years || !(*rarity->years >= years)) return false;
    }
    return true;
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    const std::string text(data, data + size);
    rainledger::Diagnostics diagnostics;
    const auto table = rainledger::read_rainfall_statistics_csv("fuzz.csv", text, diagnostics);
    const bool looks = rainledger::looks_like_statistics(text);
    if (table.has_value() == diagnostics.has_errors()) std::abort();
    for (const rainledger::Diagnostic& diagnostic : diagnostics.list())
        if (rainledger::render(diagnostic).empty()) std::abort();
    if (!table) return 0;
    if (!keeps_its_rules(*table) || !answers(*table)) std::abort();
    if (!looks && size < 200) std::abort();
    return 0;
}
