#include "report/record_clock.hpp"

#include <algorithm>
#include <cstddef>
#include <variant>
#include <vector>

#include <fmt/core.h>

#include "report/clock.hpp"

namespace rainledger {
namespace {

constexpr double kMsPerHour = 3600.0e3;
constexpr std::int64_t kMsPerMinute = 60'000;
constexpr std::size_t kDateLength = 10;  // of "2031-06-14"

/// The offset of the last known instant at or before `ms`, or of the first.
std::int16_t offset_at(const std::vector<std::int64_t>& unix_ms,
                       const std::vector<std::int16_t>& offset_minutes, std::int64_t ms) {
    const auto after = std::upper_bound(unix_ms.begin(), unix_ms.end(), ms);
    const auto count = static_cast<std::size_t>(after - unix_ms.begin());
    return offset_minutes[count > 0 ? count - 1 : 0];
}

std::string elapsed(std::int64_t ms) {
    return elapsed_text(static_cast<double>(ms) / kMsPerHour);
}

}  // namespace

bool RecordClock::has_stamps() const {
    const auto* rain = std::get_if<Hyetograph>(&record_.rain);
    return rain == nullptr || rain->stamps.has_value();
}

StampedEdges RecordClock::stamp(std::int64_t ms) const {
    StampedEdges out;
    out.unix_ms = {ms};
    out.offset_minutes = {0};
    const auto take = [&](const auto& times) {
        out.has_offset = times.has_offset;
        if (times.has_offset)
            out.offset_minutes = {offset_at(times.unix_ms, times.offset_minutes, ms)};
    };
    if (const auto* tips = std::get_if<TipLog>(&record_.rain))
        take(*tips);
    else if (has_stamps())
        take(*std::get<Hyetograph>(record_.rain).stamps);
    return out;
}

std::chrono::milliseconds RecordClock::face(std::int64_t ms) const {
    return std::chrono::milliseconds{ms + stamp(ms).offset_minutes.front() * kMsPerMinute};
}

std::string RecordClock::full(std::int64_t ms) const {
    if (!has_stamps()) return elapsed(ms);
    const std::int64_t minute =
        std::chrono::floor<std::chrono::minutes>(std::chrono::milliseconds{ms + kMsPerMinute / 2})
            .count() *
        kMsPerMinute;
    return iso_stamp(stamp(minute), 0).substr(0, kDateLength) + " " +
           face_text(face(minute), face(minute));
}

std::string RecordClock::brief(std::int64_t ms, std::int64_t first_ms) const {
    if (!has_stamps()) return elapsed(ms);
    return face_text(face(ms), face(first_ms));
}

std::optional<std::string> RecordClock::iso(std::int64_t ms) const {
    if (!has_stamps()) return std::nullopt;
    return iso_stamp(stamp(ms), 0);
}

}  // namespace rainledger
