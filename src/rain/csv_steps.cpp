#include "rain/csv_steps.hpp"

#include <cmath>
#include <limits>
#include <utility>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kSameEdge_h = 1e-9;
constexpr double kMsPerHour = 3.6e6;
constexpr double kLongestEvery_ms = 1e15;  // beyond the calendar

/// What to do about a row whose time is not later than the one before it.
std::string order_advice(RowsOf rows_of, bool same_time) {
    if (rows_of == RowsOf::storm || same_time)
        return "rows must come in the order of time, each time once";
    return "the logger's clock was set back here, or files were put together out of order: correct "
           "the times, or keep the rows before and after it as two records; rows that repeat "
           "earlier ones up to the last are left out by themselves";
}

}  // namespace

CsvStepMaker::CsvStepMaker(const CsvColumns& columns, const CsvLayout& layout,
                           CsvProblems& problems, const Coming& coming)
    : columns_(columns), layout_(layout), problems_(problems), rows_of_(coming.rows_of) {
    if (!columns.stamped) same_edge_ = columns.to_h.from_canonical(kSameEdge_h);
    if (layout.every_h)
        set_every(*layout.every_h);
    else if (!columns.start)
        form_ = Form::ends;
    else if (!columns.end)
        form_ = Form::starts;
    steps_.shortest = std::numeric_limits<double>::infinity();
    steps_.edges.reserve(coming.most_rows + 1);
    steps_.rain.reserve(coming.most_rows);
    if (columns.stamped) steps_.offset_minutes.reserve(coming.most_rows + 1);
}

void CsvStepMaker::set_every(double every_h) {
    every_ =
        columns_.stamped ? std::round(every_h * kMsPerHour) : columns_.to_h.from_canonical(every_h);
    const double most = columns_.stamped ? kLongestEvery_ms : std::numeric_limits<double>::max();
    if (!(every_ > 0.0 && every_ <= most))
        problems_.file_error("every: " + shortest(every_h) + " h is no length of a step",
                             "state how long each row covers, every: 5 min");
}

void CsvStepMaker::add(const CsvRow& row) {
    if (++rows_ == 1) first_row_ = row;
    if (is_baseline(row)) {
        if (row.has_rain) reading_ = row.rain;
        steps_.rows_before = 1;
        before_ = row.end;
    } else if (!row.timed) {
        gap_is_unread_ = true;
        add_rain(row);
    } else {
        switch (form_) {
            case Form::ends:
                add_end(row);
                break;
            case Form::starts:
                add_start(row);
                break;
            case Form::covered:
                add_covered(row);
                break;
        }
        gap_is_unread_ = false;
    }
    ready_for_plain_ = !problems_.any_error() && before_ && !steps_.rain.empty() &&
                       !columns_.stamped && !layout_.every_h;
}

bool CsvStepMaker::is_baseline(const CsvRow& row) const {
    return rows_ == 1 && columns_.kind == RainKind::cumulative && !columns_.start &&
           !columns_.stamped && row.timed && row.end.value == 0.0;
}

void CsvStepMaker::add_end(const CsvRow& row) {
    if (steps_.edges.empty()) {
        // With timestamps the first edge follows from the second row; see close_single_times.
        add_edge({});
        if (!columns_.stamped && row.end.value <= 0.0 && !before_)
            problems_.error(row.line, row.end.place,
                            "the first step ends at " + time_text(row.end) +
                                ", but rain given by end times begins at 0",
                            "if the times are starts, call the column start");
    }
    check_order(row, row.end);
    if (!steps_.rain.empty() || !columns_.stamped) note_length(row.end.value - steps_.edges.back());
    add_edge(row.end);
    add_rain(row);
}

void CsvStepMaker::add_start(const CsvRow& row) {
    check_order(row, row.start);
    if (!steps_.edges.empty()) note_length(row.start.value - steps_.edges.back());
    add_edge(row.start);
    add_rain(row);
}

void CsvStepMaker::add_covered(const CsvRow& row) {
    RowTime start = row.start;
    RowTime end = row.end;
    if (!columns_.start) {
        start = end;
        start.value -= every_;
    } else if (!columns_.end) {
        end = start;
        end.value += every_;
    }
    check_order(row, columns_.start ? row.start : row.end);
    if (end.value <= start.value)
        problems_.error(
            row.line, end.place,
            "the step ends at " + time_text(end) + ", but starts at " + time_text(start),
            "a step ends later than it starts");
    join(row, start);
    add_edge(end);
    add_rain(row);
    step_end_ = end;
}

/// Brings the edges to the start of the next covered step.
void CsvStepMaker::join(const CsvRow& row, const RowTime& start) {
    if (!step_end_) {
        add_edge(start);
    } else if (start.value < step_end_->value - same_edge_) {
        problems_.error(row.line, start.place,
                        "the step starts at " + time_text(start) +
                            ", before the one above ends at " + time_text(*step_end_),
                        layout_.every_h ? "check every:, and whether the times are starts or ends"
                                        : "steps may not overlap");
    } else if (start.value <= step_end_->value + same_edge_) {
        // Times as they were read are kept rather than ones computed from `every`.
        if (!columns_.end) steps_.edges.back() = start.value;
    } else if (layout_.gaps_are_dry) {
        steps_.holes.push_back(steps_.rain.size());
        steps_.dry.push_back(steps_.rain.size());
        steps_.rain.push_back(0.0);
        add_edge(start);
    } else if (!gap_is_unread_) {
        problems_.error(
            row.line, start.place,
            "nothing is known from " + time_text(*step_end_) + " to " + time_text(start),
            "add what is missing, or take gaps as no rain with gaps: dry in the "
            "scenario");
    }
}

/// Each row's time must be later than the one before. A row out of order is the one that the next
/// is compared with, so that one slip is one error.
void CsvStepMaker::check_order(const CsvRow& row, const RowTime& time) {
    if (before_ && time.value <= before_->value) {
        const bool same = time.value == before_->value;
        problems_.error(
            row.line, time.place,
            same ? "the time of the row above comes again, " + time_text(time)
                 : "time goes back, from " + time_text(*before_) + " to " + time_text(time),
            order_advice(rows_of_, same));
        step_end_.reset();
    }
    before_ = time;
}

void CsvStepMaker::add_edge(const RowTime& time) {
    steps_.edges.push_back(time.value);
    if (columns_.stamped) steps_.offset_minutes.push_back(time.offset_minutes);
}

void CsvStepMaker::add_rain(const CsvRow& row) {
    double rain = row.has_rain ? row.rain : 0.0;
    if (columns_.kind == RainKind::cumulative) rain = row.has_rain ? increment(row) : 0.0;
    if (row.missing) steps_.dry.push_back(steps_.rain.size());
    steps_.rain.push_back(columns_.to_mm.to_canonical(rain));
}

/// What fell since the last known reading: across missing readings and holes nothing is lost, it
/// falls in the step of the reading that shows it.
double CsvStepMaker::increment(const CsvRow& row) {
    const double since = row.rain - reading_.value_or(0.0);
    if (since < 0.0)
        problems_.error(
            row.line, row.rain_place,
            "cumulative rain falls from " + shortest(*reading_) + " to " + shortest(row.rain),
            "if the gauge started anew here, give the rain as depth per step");
    if (!first_reading_.has_rain) first_reading_ = row;
    reading_ = row.rain;
    return since;
}

CsvSteps CsvStepMaker::finish() {
    if (steps_.rain.empty() && rows_ > 0)
        problems_.error(first_row_.line, first_row_.end.place,
                        "a reading at time 0 alone gives no rain",
                        "the first reading is where counting begins; add the rows after it");
    if (!problems_.any_error()) {
        if (form_ != Form::covered) close_single_times();
        warn_of_first_reading();
    }
    return std::move(steps_);
}

/// With one time per row, the edge at the open end is as far off as its neighbours are apart.
void CsvStepMaker::close_single_times() {
    std::vector<double>& edges = steps_.edges;
    if (form_ == Form::ends && !columns_.stamped) return;
    const RowTime& first = columns_.start ? first_row_.start : first_row_.end;
    if (steps_.rain.size() == 1) {
        problems_.error(first_row_.line, first.place,
                        "a single row does not tell how long its step is",
                        "state it in the scenario with every:, such as every: 5 min");
    } else if (form_ == Form::ends) {
        edges[0] = edges[1] - (edges[2] - edges[1]);
        steps_.offset_minutes[0] = steps_.offset_minutes[1];
    } else {
        const std::size_t last = edges.size() - 1;
        RowTime end = *before_;
        end.value += edges[last] - edges[last - 1];
        add_edge(end);
    }
}

/// Timestamps do not say what the counter read before the first row.
void CsvStepMaker::warn_of_first_reading() {
    if (!columns_.stamped || !first_reading_.has_rain || !(first_reading_.rain > 0.0)) return;
    const std::string stretch = columns_.end ? "before " + time_text(first_reading_.end)
                                             : "after " + time_text(first_reading_.start);
    problems_.warning(first_reading_.line, first_reading_.rain_place,
                      "the first reading, " + shortest(first_reading_.rain) + " " +
                          columns_.rain_unit + ", is taken as rain that fell " + stretch,
                      "if the counter did not stand at 0 when the storm began, subtract what it "
                      "showed then from every reading");
}

std::string CsvStepMaker::time_text(const RowTime& time) const {
    if (!columns_.stamped) return shortest(time.value) + " " + columns_.time_unit;
    StampedEdges edge;
    edge.unix_ms = {static_cast<std::int64_t>(time.value)};
    edge.offset_minutes = {time.offset_minutes};
    edge.has_offset = time.has_offset;
    return iso_stamp(edge, 0);
}

}  // namespace rainledger
