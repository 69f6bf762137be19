#pragma once

#include <algorithm>
#include <cstddef>
#include <cstdint>
#include <limits>
#include <optional>
#include <string>
#include <vector>

#include "rain/csv_rows.hpp"
#include "rain/hyetograph_reading.hpp"

// Rows become steps: edges in order, holes found, cumulative readings turned into depths.
namespace rainledger {

/// The steps as the rows give them, before conversion.
struct CsvSteps {
    std::vector<double> edges;                 ///< steps + 1, as RowTime::value
    std::vector<std::int16_t> offset_minutes;  ///< one per edge; only for timestamps
    std::vector<double> rain;                  ///< one per step: mm, or mm/h for intensities
    std::vector<std::size_t> holes;            ///< steps that stand for no row
    std::vector<std::size_t> dry;              ///< steps taken as no rain, holes included
    std::size_t rows_before = 0;  ///< rows above the first step's row (a baseline reading)
    double shortest = 0.0;        ///< step as the rows give it, between two rows or within one
    double longest = 0.0;
};

/// A row as bare numbers in the file's units; a time without a column stays 0.
struct PlainRow {
    double start = 0.0;
    double end = 0.0;
    double rain = 0.0;
};

class CsvStepMaker {
public:
    struct Coming {
        RowsOf rows_of = RowsOf::storm;
        std::size_t most_rows = 0;  ///< about, to set memory aside
    };
    CsvStepMaker(const CsvColumns& columns, const CsvLayout& layout, CsvProblems& problems,
                 const Coming& coming);

    void add(const CsvRow& row);
    /// Notes a row that could not be told into cells.
    void add_unread() { gap_is_unread_ = true; }

    /// Adds a row of elapsed times that follows on from a sound row and has nothing to report.
    /// False, and nothing done, for any other.
    [[nodiscard]] bool add_plain(const PlainRow& row);

    /// The steps, once all rows are in; reports what only the whole file shows. Of use only when
    /// there was no error.
    [[nodiscard]] CsvSteps finish();

private:
    /// How a row gives its step.
    enum class Form : std::uint8_t {
        ends,     ///< from the row before to its own time
        starts,   ///< from its own time to the row after
        covered,  ///< start and end both known: two columns, or `every`
    };

    [[nodiscard]] bool follows_on(const PlainRow& row, double time) const;
    void set_every(double every_h);
    [[nodiscard]] bool is_baseline(const CsvRow& row) const;
    [[nodiscard]] double increment(const CsvRow& row);
    void add_end(const CsvRow& row);
    void add_start(const CsvRow& row);
    void add_covered(const CsvRow& row);
    void check_order(const CsvRow& row, const RowTime& time);
    void join(const CsvRow& row, const RowTime& start);
    void add_edge(const RowTime& time);
    void add_rain(const CsvRow& row);
    void note_length(double length);
    void close_single_times();
    void warn_of_first_reading();
    [[nodiscard]] std::string time_text(const RowTime& time) const;

    const CsvColumns& columns_;
    const CsvLayout& layout_;
    CsvProblems& problems_;
    RowsOf rows_of_;
    Form form_ = Form::covered;
    double every_ = 0.0;      // in units of RowTime::value
    double same_edge_ = 0.0;  // nearer times are one edge
    CsvSteps steps_;

    bool ready_for_plain_ = false;  // the last row was sound
    std::size_t rows_ = 0;
    CsvRow first_row_;
    std::optional<RowTime> before_;    // the time of the last row that had one
    std::optional<RowTime> step_end_;  // where the last covered step ends
    bool gap_is_unread_ = false;       // a row in between could not be read: no talk of holes

    std::optional<double> reading_;  // cumulative: the last known one
    CsvRow first_reading_;
};

inline bool CsvStepMaker::follows_on(const PlainRow& row, double time) const {
    constexpr double kMost = std::numeric_limits<double>::max();
    if (!ready_for_plain_ || !(time > before_->value && time <= kMost)) return false;
    const bool cumulative = columns_.kind == RainKind::cumulative;
    if (cumulative && !reading_) return false;
    if (!(row.rain >= (cumulative ? *reading_ : 0.0) && row.rain <= kMost)) return false;
    if (form_ != Form::covered) return true;
    return row.start == step_end_->value && row.end > row.start && row.end <= kMost;
}

inline bool CsvStepMaker::add_plain(const PlainRow& row) {
    const double time = columns_.start ? row.start : row.end;
    if (!follows_on(row, time)) return false;
    if (form_ == Form::covered) {
        step_end_->value = row.end;
        steps_.edges.push_back(row.end);
    } else {
        note_length(time - before_->value);
        steps_.edges.push_back(time);
    }
    before_->value = time;
    double rain = row.rain;
    if (columns_.kind == RainKind::cumulative) {
        rain -= *reading_;
        reading_ = row.rain;
    }
    steps_.rain.push_back(columns_.to_mm.to_canonical(rain));
    return true;
}

inline void CsvStepMaker::note_length(double length) {
    steps_.shortest = std::min(steps_.shortest, length);
    steps_.longest = std::max(steps_.longest, length);
}

}  // namespace rainledger
