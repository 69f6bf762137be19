#pragma once

#include <cstddef>
#include <cstdint>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "rain/csv_header.hpp"
#include "rain/csv_text.hpp"
#include "rainledger/rain/timestamp.hpp"

// The data rows of a hyetograph CSV, one by one.
namespace rainledger {

/// A time as read. Elapsed times are in the unit of the file, timestamps in ms since 1970 (a
/// double holds every ms of the calendar exactly), so that one arithmetic serves both.
struct RowTime {
    double value = 0.0;
    std::int16_t offset_minutes = 0;
    bool has_offset = false;
    std::size_t place = 0;  ///< byte column of the cell
};

struct CsvRow {
    std::size_t line = 0;
    RowTime start;  ///< if there is a start column
    RowTime end;    ///< if there is an end column
    bool timed = false;
    bool has_rain = false;  ///< the rain cell holds a number
    bool missing = false;   ///< the rain cell holds a mark for no value
    double rain = 0.0;      ///< in the file's unit
    std::size_t rain_place = 0;
};

class CsvRowReader {
public:
    CsvRowReader(const CsvColumns& columns, const CsvLayout& layout, std::optional<Zone>& zone,
                 CsvProblems& problems);

    /// Reads one row and reports what is wrong with it. False when the row cannot be told into
    /// cells at all.
    [[nodiscard]] bool read(const CsvLine& line, CsvRow& row);

    /// Goes on as if the row read last had been one at this time.
    void resume_at(const RowTime& time) { stamp_before_ = static_cast<std::int64_t>(time.value); }

    /// Timestamps carried offsets.
    [[nodiscard]] bool saw_offsets() const { return offsets_ == Offsets::written; }
    /// A point is known to be the decimal mark.
    [[nodiscard]] bool uses_decimal_points() const { return decimal_mark_ == '.'; }
    /// The stated mark for a missing value, where it is a number.
    [[nodiscard]] std::optional<double> missing_number() const { return missing_number_; }
    /// The header says timestamps, but the first row holds a number: no row can be read.
    [[nodiscard]] bool header_lacks_unit() const { return header_lacks_unit_; }

private:
    enum class Role : std::uint8_t { ignored, start, end, rain };
    enum class Offsets : std::uint8_t { unknown, written, absent };

    void read_cell(Role role, const CsvLine& line, const char*& at, CsvRow& row);
    bool read_plain_number(const char*& at, const CsvLine& line, double& value);
    void read_rain(const CsvLine& line, const CsvCell& cell, CsvRow& row);
    void take_rain(double value, const CsvLine& line, CsvRow& row);
    void read_time(Role role, const CsvLine& line, const CsvCell& cell, CsvRow& row);
    bool read_reading(Role role, const CsvLine& line, const CsvCell& cell);
    bool place_stamp(Role role, const CsvLine& line, RowTime& time);
    bool check_offset(bool written, const CsvLine& line, std::size_t place);
    std::optional<double> read_number(Role role, std::string_view text, const CsvLine& line,
                                      std::size_t place);
    void report_no_number(Role role, std::string_view text, const CsvLine& line, std::size_t place);
    [[nodiscard]] std::string number_advice(Role role, std::string_view text) const;
    bool note_decimal_mark(char mark, const CsvLine& line, std::size_t place);
    void report_cell_count(const CsvLine& line, const char* at, std::size_t seen);
    [[nodiscard]] bool marks_missing(std::string_view text) const;

    const CsvColumns& columns_;
    const CsvLayout& layout_;
    std::optional<Zone>& zone_;
    CsvProblems& problems_;
    std::vector<Role> roles_;
    std::optional<double> missing_number_;
    std::string buffer_;   // of cells with doubled quotes
    std::string decimal_;  // of cells with a decimal comma
    char decimal_mark_ = '\0';
    Offsets offsets_ = Offsets::unknown;
    ClockReading start_reading_;
    ClockReading end_reading_;
    std::optional<std::int64_t> stamp_before_;
    bool first_row_ = true;
    bool header_lacks_unit_ = false;
};

}  // namespace rainledger
