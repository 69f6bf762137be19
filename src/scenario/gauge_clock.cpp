#include "scenario/gauge_clock.hpp"

#include <algorithm>
#include <cstddef>
#include <span>
#include <string_view>
#include <utility>

#include "scenario/shown.hpp"

namespace rainledger {
namespace {

constexpr double kMsPerHour = 3.6e6;
constexpr std::int64_t kMsPerMinute = 60'000;

/// The instants of a stamped record at which an offset is known, and those offsets.
struct KnownOffsets {
    std::span<const std::int64_t> unix_ms;
    std::span<const std::int16_t> minutes;
};

KnownOffsets offsets_of(const GaugeRecord& record) {
    if (const auto* tips = std::get_if<TipLog>(&record.rain))
        return {tips->unix_ms, tips->offset_minutes};
    const StampedEdges& stamps = *std::get<Hyetograph>(record.rain).stamps;
    return {stamps.unix_ms, stamps.offset_minutes};
}

/// The offset at the last such instant that is not later, else at the first, in ms.
std::int64_t offset_ms_at(const GaugeRecord& record, std::int64_t instant_ms) {
    const KnownOffsets known = offsets_of(record);
    if (!has_offset(record) || known.minutes.empty()) return 0;
    const auto next = std::ranges::upper_bound(known.unix_ms, instant_ms);
    const auto i = std::max<std::ptrdiff_t>(next - known.unix_ms.begin(), 1) - 1;
    return known.minutes[static_cast<std::size_t>(i)] * kMsPerMinute;
}

/// A reading of a clock's face, "2031-06-14 13:45", with seconds where there are any.
std::string face_text(std::int64_t face_ms) {
    StampedEdges face;
    face.unix_ms = {face_ms};
    constexpr std::size_t kToMinute = std::string_view("2031-06-14T13:45").size();
    constexpr std::size_t kToSecond = std::string_view("2031-06-14T13:45:00").size();
    std::string text = iso_stamp(face, 0).substr(0, kToSecond);
    if (text.ends_with(":00")) text.resize(kToMinute);
    text[text.find('T')] = ' ';
    return text;
}

double tips_between(const TipLog& tips, std::int64_t from_ms, std::int64_t to_ms) {
    const auto first = std::ranges::upper_bound(tips.unix_ms, from_ms) - tips.unix_ms.begin();
    double depth_mm = 0.0;
    for (auto i = static_cast<std::size_t>(first); i < tips.unix_ms.size(); ++i) {
        if (tips.unix_ms[i] > to_ms) break;
        depth_mm += tips.depth(i);
    }
    return depth_mm;
}

double interval_depth(const Hyetograph& rain, std::int64_t from_ms, std::int64_t to_ms) {
    const std::vector<std::int64_t>& edge = rain.stamps->unix_ms;
    double depth_mm = 0.0;
    for (std::size_t i = 0; i < rain.own_steps && edge[i] < to_ms; ++i) {
        const std::int64_t inside = std::min(edge[i + 1], to_ms) - std::max(edge[i], from_ms);
        if (inside > 0)
            depth_mm += rain.depth_mm[i] * static_cast<double>(inside) /
                        static_cast<double>(edge[i + 1] - edge[i]);
    }
    return depth_mm;
}

}  // namespace

bool is_stamped(const GaugeRecord& record) {
    return record.is_tips() || std::get<Hyetograph>(record.rain).stamps.has_value();
}

bool has_offset(const GaugeRecord& record) {
    if (const auto* tips = std::get_if<TipLog>(&record.rain)) return tips->has_offset;
    const auto& stamps = std::get<Hyetograph>(record.rain).stamps;
    return stamps && stamps->has_offset;
}

std::string clock_text(const GaugeRecord& record, std::int64_t instant_ms) {
    if (!is_stamped(record)) return brief(static_cast<double>(instant_ms) / kMsPerHour) + " h";
    return face_text(instant_ms + offset_ms_at(record, instant_ms));
}

std::string start_text(const GaugeRecord& record, const RainEvent& event) {
    const auto* tips = std::get_if<TipLog>(&record.rain);
    if (tips == nullptr || event.first >= event.end) return clock_text(record, event.from_ms);
    return face_text(event.from_ms + offset_ms_at(record, tips->unix_ms[event.first]));
}

std::optional<std::int64_t> instant_of(const GaugeRecord& record, const ClockReading& reading,
                                       const std::optional<std::string>& zone) {
    if (reading.has_offset || !has_offset(record)) return reading.unix_ms();
    if (zone)
        if (auto place = Zone::find(*zone)) return place->instant(reading.face_ms, std::nullopt);
    const std::int64_t near_ms = reading.face_ms - offset_ms_at(record, reading.face_ms);
    return reading.face_ms - offset_ms_at(record, near_ms);
}

double depth_between(const GaugeRecord& record, std::int64_t from_ms, std::int64_t to_ms) {
    if (const auto* tips = std::get_if<TipLog>(&record.rain))
        return tips_between(*tips, from_ms, to_ms);
    return interval_depth(std::get<Hyetograph>(record.rain), from_ms, to_ms);
}

}  // namespace rainledger
