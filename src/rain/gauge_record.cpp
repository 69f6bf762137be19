#include "rainledger/rain/gauge_record.hpp"

#include <cmath>
#include <numeric>
#include <utility>

#include "rain/csv_opening.hpp"
#include "rain/interval_record.hpp"
#include "rain/rain_elements.hpp"
#include "rain/tip_log_csv.hpp"

namespace rainledger {
namespace {

double depth_of(const TipLog& log) {
    if (log.depth_mm.empty()) return static_cast<double>(log.unix_ms.size()) * log.tip_mm;
    return std::accumulate(log.depth_mm.begin(), log.depth_mm.end(), 0.0);
}

double depth_of(const Hyetograph& rain) {
    return total_depth_mm(rain);
}

}  // namespace

std::optional<GaugeRecord> read_gauge_record(const std::string& name, std::string text,
                                             const RecordLayout& layout, Diagnostics& diagnostics) {
    auto plain = without_mark(name, std::move(text), diagnostics);
    if (!plain) return std::nullopt;
    auto record = layout.tip_mm
                      ? read_tip_log(name, *std::move(plain), layout, diagnostics)
                      : read_interval_record(name, *std::move(plain), layout.csv, diagnostics);
    if (record) record->file = name;
    return record;
}

double total_depth_mm(const GaugeRecord& record) {
    return std::visit([](const auto& rain) { return depth_of(rain); }, record.rain);
}

RecordSpan span_of(const GaugeRecord& record) {
    if (const auto* const log = std::get_if<TipLog>(&record.rain))
        return {log->unix_ms.front(), log->unix_ms.back()};
    const auto& rain = std::get<Hyetograph>(record.rain);
    return {edge_ms(rain, 0), edge_ms(rain, rain.own_steps)};
}

std::int64_t edge_ms(const Hyetograph& rain, std::size_t edge) {
    if (rain.stamps) return rain.stamps->unix_ms[edge];
    return std::llround(rain.edges_h[edge] * kMsPerHour);
}

std::size_t edge_behind(const Hyetograph& rain, std::int64_t ms) {
    std::size_t first = 0;
    std::size_t count = rain.own_steps + 1;
    while (count > 0) {
        const std::size_t middle = first + count / 2;
        if (edge_ms(rain, middle) <= ms) {
            count -= middle + 1 - first;
            first = middle + 1;
        } else {
            count = middle - first;
        }
    }
    return first;
}

}  // namespace rainledger
