#pragma once

#include <cstdint>
#include <optional>
#include <string>
#include <string_view>

namespace date {
class time_zone;
}

// ISO 8601 timestamps, read strictly, and the time zones that turn a clock's reading into an
// instant.
namespace rainledger {

/// What a timestamp says: the clock's face and, where it is written, the offset from UTC.
struct ClockReading {
    std::int64_t face_ms = 0;  ///< ms from 1970-01-01 00:00 on the clock's face; no offset applied
    std::int16_t offset_minutes = 0;  ///< local time minus UTC; 0 where none is written
    bool has_offset = false;

    /// Milliseconds since 1970-01-01 00:00 UTC, taking a reading without offset for UTC.
    [[nodiscard]] std::int64_t unix_ms() const {
        return face_ms - std::int64_t{offset_minutes} * 60'000;
    }
};

/// A timestamp read from text, or what is wrong with it and what to write instead.
struct ParsedStamp {
    std::optional<ClockReading> value;
    std::string problem;  ///< empty when there is a value
    std::string hint;
};

/// Reads `YYYY-MM-DD`, `T` or exactly one blank, `HH:MM`, `HH:MM:SS` or `HH:MM:SS.f` (one to three
/// decimals), and then nothing, `Z`, `+HH:MM`, `+HHMM` or `+HH` (or with `-`). The whole text or
/// nothing. 24:00 is 00:00 of the next day, as loggers write it; years run from 1 to 9999, offsets
/// from -18:00 to +18:00. Impossible dates and times (30 February, 10:60, a leap second) are
/// refused.
[[nodiscard]] ParsedStamp parse_stamp(std::string_view text);

/// A time zone of the machine's database, which is loaded when the first zone is asked for. It
/// remembers the stretch of time it was last asked about: one per thread.
class Zone {
public:
    /// The zone of an IANA name ("Europe/Madrid"). Nothing if it is unknown or the machine has no
    /// database; never throws.
    [[nodiscard]] static std::optional<Zone> find(const std::string& name);

    /// The earliest instant, in ms since 1970-01-01 00:00 UTC, at which clocks read `face_ms` and
    /// that is not before `not_before_ms`. When every such instant is before, the last one: the
    /// caller's order check finds it. Nothing for a reading that the clocks skip.
    [[nodiscard]] std::optional<std::int64_t> instant(std::int64_t face_ms,
                                                      std::optional<std::int64_t> not_before_ms);

    /// Local time minus UTC at an instant, in minutes.
    [[nodiscard]] std::int16_t offset_minutes(std::int64_t unix_ms);

private:
    /// A stretch of time with one offset, kept because neighbouring readings mostly share it.
    struct Stretch {
        std::int64_t begin_ms = 0;
        std::int64_t end_ms = 0;
        std::int64_t offset_ms = 0;
    };

    explicit Zone(const date::time_zone& zone) : zone_(&zone) {}
    [[nodiscard]] const Stretch& stretch_at(std::int64_t unix_ms);

    const date::time_zone* zone_;
    Stretch known_;
};

}  // namespace rainledger
