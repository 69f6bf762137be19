#pragma once

#include <chrono>
#include <cstdint>
#include <optional>
#include <string>

#include "rainledger/rain/gauge_record.hpp"

namespace rainledger {

/// Instants of a gauge record as its clock showed them; elapsed time where it has no stamps. Keeps
/// a reference to the record.
class RecordClock {
public:
    explicit RecordClock(const GaugeRecord& record) : record_(record) {}

    [[nodiscard]] bool has_stamps() const;
    /// "2031-06-14 13:45", to the minute; "5:30" of elapsed time.
    [[nodiscard]] std::string full(std::int64_t ms) const;
    /// "15:10", or "15 Jun 02:15" on another day than that of `first_ms`; "5:30" of elapsed time.
    [[nodiscard]] std::string brief(std::int64_t ms, std::int64_t first_ms) const;
    /// ISO 8601 with the UTC offset where it is known; nothing for elapsed time.
    [[nodiscard]] std::optional<std::string> iso(std::int64_t ms) const;

private:
    [[nodiscard]] StampedEdges stamp(std::int64_t ms) const;
    [[nodiscard]] std::chrono::milliseconds face(std::int64_t ms) const;

    const GaugeRecord& record_;
};

}  // namespace rainledger
