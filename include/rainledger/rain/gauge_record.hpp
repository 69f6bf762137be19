#pragma once

#include <cstddef>
#include <cstdint>
#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/hyetograph.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

// Records of rain gauges: tipping-bucket logs and interval data of months or years.
namespace rainledger {

/// What the reader met in a record and how it was taken, counted for the reports.
struct RecordNotes {
    std::size_t rows = 0;              ///< rows of data read
    std::size_t same_instant = 0;      ///< tips at the instant of the tip before; each counts
    std::size_t repeated_rows = 0;     ///< rows of an overlapping download, dropped
    std::size_t clock_set_back = 0;    ///< times that the clock went back; tips keep their stamps
    std::size_t counter_restarts = 0;  ///< times that a running count fell; it then counts from 0
    std::size_t repeated_headers = 0;  ///< header rows in the midst, written by a restart
    bool partial_last_line = false;    ///< a last line without its end that made no row, dropped
};

/// A tipping-bucket log: one entry per row with rain, one at least. Times rise or are equal.
struct TipLog {
    double tip_mm = 0.0;                       ///< depth of one tip
    std::vector<std::int64_t> unix_ms;         ///< as in StampedEdges
    std::vector<std::int16_t> offset_minutes;  ///< empty where has_offset is false
    std::vector<double> depth_mm;              ///< tips times tip_mm; empty where each is one tip
    bool has_offset = false;
    bool clock_assumed = false;  ///< as in Hyetograph

    [[nodiscard]] double depth(std::size_t i) const {
        return depth_mm.empty() ? tip_mm : depth_mm[i];
    }
};

/// A record: tips, or interval data as a hyetograph whose holes are steps taken as dry.
struct GaugeRecord {
    std::variant<TipLog, Hyetograph> rain;
    RecordNotes notes;
    std::string file;  ///< as named by who asked for it

    [[nodiscard]] bool is_tips() const { return std::holds_alternative<TipLog>(rain); }
};

/// How a record is written.
struct RecordLayout {
    /// For columns, units, zone, missing and every as in a hyetograph's CSV; gaps count as dry. For
    /// a tip log `rain_column` names the column of counts, if there is one.
    CsvLayout csv;
    std::optional<double> tip_mm;  ///< given: a tip log, else interval data
    bool running_count = false;    ///< the count column is a counter that only rises
};

/// Reads a record in time in proportion to its rows; problems as read_hyetograph_csv reports them.
///
/// Tip log: a row per tip with its `time`, a timestamp (elapsed times are refused), and optionally
/// a column of counts (`tips`, `count`, or the named one): the tips at that row, or the counter's
/// reading (running_count; the first reading is where it stood before). Counts are whole numbers;
/// an empty one, or 0, is no tip. A log in which no row is a tip is an error. Reading takes, beyond
/// the text, at most 40 bytes per row. Everything odd is counted in the notes, and each kind is a
/// warning at the first place where it was met:
/// - two tips in one instant: both count;
/// - a header row in the midst (a restarted logger): passed over;
/// - a running count that falls: the counter restarted from 0 and its reading counts whole;
/// - rows that go back in time and repeat earlier rows, as text, one by one up to the last one or
///   to the end of the file: an overlapping download, dropped; that go back otherwise: the clock
///   was set back, the tips keep their stamps and are put in order;
/// - a last line without a line end that makes no row: dropped. So is one that ends in its time if
///   that is earlier than the time above, or written with fewer characters: it may be cut short.
///
/// Interval data: read_hyetograph_csv with holes as dry steps; repeated headers, overlapping
/// downloads (here a row at the very time of the one before may begin one) and a partial last line
/// (also one without rain) are taken as above; a clock set back is an error that says so.
[[nodiscard]] std::optional<GaugeRecord> read_gauge_record(const std::string& name,
                                                           std::string text,
                                                           const RecordLayout& layout,
                                                           Diagnostics& diagnostics);

/// Depth of all its rain in mm, and its first and last instant: ms as in StampedEdges, of elapsed
/// times ms since 0. A tip log begins and ends with a tip.
[[nodiscard]] double total_depth_mm(const GaugeRecord& record);
struct RecordSpan {
    std::int64_t from_ms = 0;
    std::int64_t to_ms = 0;
};
[[nodiscard]] RecordSpan span_of(const GaugeRecord& record);

}  // namespace rainledger
