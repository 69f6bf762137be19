#include <algorithm>
#include <cmath>
#include <cstddef>
#include <cstdint>
#include <cstdlib>
#include <string>
#include <variant>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"

// Any bytes are either a record whose events and the rain outside them are all its rain, or at
// least one error.
namespace {

using namespace rainledger;

/// The first byte picks what the scenario says about the file.
RecordLayout layout_of(std::uint8_t choice) {
    RecordLayout layout;
    if ((choice & 1U) != 0) layout.tip_mm = 0.2;
    if ((choice & 2U) != 0) layout.running_count = true;
    if ((choice & 4U) != 0) layout.csv.zone = "Europe/Madrid";
    if ((choice & 8U) != 0) layout.csv.missing = "-999";
    if ((choice & 16U) != 0) layout.csv.every_h = 5.0 / 60.0;
    return layout;
}

void check_order(const GaugeRecord& record) {
    const auto* const log = std::get_if<TipLog>(&record.rain);
    if (log == nullptr) return;
    if (log->unix_ms.empty() || !std::is_sorted(log->unix_ms.begin(), log->unix_ms.end()))
        std::abort();
    if (log->has_offset && log->offset_minutes.size() != log->unix_ms.size()) std::abort();
}

void check_events(const GaugeRecord& record, const EventRule& rule, const EventSteps& steps) {
    const double all_mm = total_depth_mm(record);
    const double tolerance_mm = 1e-9 * std::fmax(1.0, all_mm);
    const RecordEvents found = find_events(record, rule, steps);
    double sum_mm = found.outside_mm;
    for (const RainEvent& event : found.events) {
        sum_mm += event.depth_mm;
        if (steps_of(record, event, steps) > 10'000) continue;
        const Hyetograph rain = event_rain(record, event, rule, steps);
        if (!(std::fabs(total_depth_mm(rain) - event.depth_mm) <= tolerance_mm)) std::abort();
    }
    if (!(std::fabs(sum_mm - all_mm) <= tolerance_mm)) std::abort();
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    if (size == 0) return 0;
    Diagnostics diagnostics;
    const auto record = read_gauge_record("fuzz.csv", std::string(data + 1, data + size),
                                          layout_of(data[0]), diagnostics);
    if (record.has_value() == diagnostics.has_errors()) std::abort();
    for (const Diagnostic& diagnostic : diagnostics.list())
        if (render(diagnostic).empty()) std::abort();
    if (!record) return 0;
    check_order(*record);
    const EventRule rule{6.0, (data[0] & 32U) != 0 ? 1.0 : 0.0};
    check_events(*record, rule, {5.0 / 60.0, (data[0] & 64U) != 0});
    return 0;
}
