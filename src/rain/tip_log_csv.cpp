#include "rain/tip_log_csv.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <cstdint>
#include <numeric>
#include <string_view>
#include <utility>
#include <vector>

#include "rain/csv_opening.hpp"
#include "rain/csv_rows.hpp"
#include "rain/csv_text.hpp"
#include "rain/partial_line.hpp"
#include "rain/record_oddities.hpp"
#include "rain/record_order.hpp"
#include "rain/tip_log_header.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kLargest_mm = 1e12;
constexpr std::string_view kExample =
    "a tip log begins with a row 'time' or 'time,tips', then one row per tip";

/// `values` in the order of `from`.
template <typename T>
void reorder(std::vector<T>& values, const std::vector<std::uint32_t>& from) {
    if (values.empty()) return;
    std::vector<T> ordered;
    ordered.reserve(values.size());
    for (const std::uint32_t i : from)
        ordered.push_back(values[i]);
    values = std::move(ordered);
}

void put_in_order(TipLog& log) {
    if (std::ranges::is_sorted(log.unix_ms)) return;
    std::vector<std::uint32_t> from(log.unix_ms.size());
    std::iota(from.begin(), from.end(), 0U);
    std::ranges::stable_sort(from, {}, [&](std::uint32_t i) { return log.unix_ms[i]; });
    reorder(log.unix_ms, from);
    reorder(log.offset_minutes, from);
    reorder(log.depth_mm, from);
}

std::string time_text(const RowTime& time) {
    StampedEdges edge;
    edge.unix_ms = {static_cast<std::int64_t>(time.value)};
    edge.offset_minutes = {time.offset_minutes};
    edge.has_offset = time.has_offset;
    return iso_stamp(edge, 0);
}

class TipLogReader {
public:
    TipLogReader(const SourceText& source, const RecordLayout& layout, RecordOddities& oddities,
                 CsvProblems& problems)
        : layout_(layout),
          oddities_(oddities),
          problems_(problems),
          text_(source.text()),
          lines_(source.text()) {
        log_.tip_mm = *layout.tip_mm;
    }

    std::optional<TipLog> read();
    [[nodiscard]] std::size_t rows() const { return rows_; }

private:
    bool open();
    void read_rows();
    [[nodiscard]] bool leaves_out(const CsvLine& line, const CsvRow& row, RecordOrder& order);
    void take(const CsvLine& line, const CsvRow& row);
    [[nodiscard]] double tips_of(const CsvLine& line, const CsvRow& row);
    [[nodiscard]] double tips_since(const CsvLine& line, const CsvRow& row);
    void add(const CsvLine& line, const CsvRow& row, double tips);
    void add_depth(double tips);

    const RecordLayout& layout_;
    RecordOddities& oddities_;
    CsvProblems& problems_;
    std::string_view text_;
    CsvLines lines_;
    CsvLine header_;
    CsvColumns columns_;
    std::optional<Zone> zone_;
    TipLog log_;
    std::size_t rows_ = 0;
    std::optional<double> reading_;  // of a running count
};

bool TipLogReader::open() {
    if (holds_nul(text_, problems_)) return false;
    zone_ = find_zone(layout_.csv, problems_);
    if (!lines_.next(header_)) {
        problems_.file_error("the file holds no rows", std::string(kExample));
        return false;
    }
    auto columns = read_tip_header(header_, layout_, problems_);
    if (!columns) return false;
    columns_ = *std::move(columns);
    lines_.use_separator(columns_.separator);
    return !problems_.any_error();
}

void TipLogReader::read_rows() {
    CsvRowReader reader(columns_, layout_.csv, zone_, problems_);
    RecordOrder order(header_.text, SameTime::is_news, zone_ ? kClockChange_ms : 0.0, oddities_);
    // Counted first, since a vector that grows takes three times its size for a moment.
    const auto lines = static_cast<std::size_t>(std::count(text_.begin(), text_.end(), '\n'));
    log_.unix_ms.reserve(lines);
    CsvLine line;
    CsvRow row;
    while (lines_.next(line) && !reader.header_lacks_unit()) {
        if (order.leaves_out_header(line, lines_)) continue;
        if (!reader.read(line, row) || !row.timed) continue;
        if (leaves_out(line, row, order))
            reader.resume_at(order.last());
        else
            take(line, row);
    }
    log_.clock_assumed = !log_.has_offset;
}

/// Whether a row is left out, since it begins a repetition of earlier ones.
bool TipLogReader::leaves_out(const CsvLine& line, const CsvRow& row, RecordOrder& order) {
    const RowTime before = order.last();
    const RecordOrder::Verdict verdict = order.judge(line, row.start, lines_);
    if (verdict == RecordOrder::Verdict::back)
        oddities_.note(Oddity::clock_set_back, line, row.start.place,
                       "time goes back, from " + time_text(before) + " to " + time_text(row.start) +
                           "; the tips keep their times and are put in order");
    return verdict == RecordOrder::Verdict::repeated;
}

void TipLogReader::take(const CsvLine& line, const CsvRow& row) {
    ++rows_;
    const double tips = columns_.has_rain ? tips_of(line, row) : 1.0;
    if (tips > 0.0) add(line, row, tips);
}

double TipLogReader::tips_of(const CsvLine& line, const CsvRow& row) {
    if (!row.has_rain) return 0.0;
    if (row.rain != std::floor(row.rain)) {
        problems_.error(line.number, row.rain_place,
                        shortest(row.rain) + " is not a whole number of tips",
                        "for depths instead of counts leave out tip: and state unit: mm");
        return 0.0;
    }
    const double tips = layout_.running_count ? tips_since(line, row) : row.rain;
    if (!(tips * log_.tip_mm <= kLargest_mm)) {
        problems_.error(line.number, row.rain_place,
                        "this rain is too large to compute with, over 1e12 mm",
                        "check the count and the depth of a tip");
        return 0.0;
    }
    return tips;
}

/// The tips since a counter's last reading.
double TipLogReader::tips_since(const CsvLine& line, const CsvRow& row) {
    const double before = reading_.value_or(row.rain);
    reading_ = row.rain;
    if (row.rain >= before) return row.rain - before;
    oddities_.note(Oddity::counter_restart, line, row.rain_place,
                   "the count falls from " + shortest(before) + " to " + shortest(row.rain) +
                       "; the counter is taken to have restarted from 0");
    return row.rain;
}

void TipLogReader::add(const CsvLine& line, const CsvRow& row, double tips) {
    const auto ms = static_cast<std::int64_t>(row.start.value);
    if (!log_.unix_ms.empty() && log_.unix_ms.back() == ms)
        oddities_.note(Oddity::same_instant, line, row.start.place,
                       "this tip falls at the instant of the one before; both count");
    if (log_.unix_ms.empty() && row.start.has_offset) {
        log_.has_offset = true;
        log_.offset_minutes.reserve(log_.unix_ms.capacity());
    }
    add_depth(tips);
    log_.unix_ms.push_back(ms);
    if (log_.has_offset) log_.offset_minutes.push_back(row.start.offset_minutes);
}

/// Depths are kept from the first row on that holds more than one tip.
void TipLogReader::add_depth(double tips) {
    if (tips == 1.0 && log_.depth_mm.empty()) return;
    if (log_.depth_mm.empty()) {
        log_.depth_mm.reserve(log_.unix_ms.capacity());
        log_.depth_mm.assign(log_.unix_ms.size(), log_.tip_mm);
    }
    log_.depth_mm.push_back(tips * log_.tip_mm);
}

std::optional<TipLog> TipLogReader::read() {
    if (!open()) return std::nullopt;
    read_rows();
    if (problems_.any_error()) return std::nullopt;
    if (log_.unix_ms.empty()) {
        problems_.error(
            columns_.line, 1,
            rows_ == 0 ? "there are no rows below the header" : "no row below the header is a tip",
            std::string(kExample));
        return std::nullopt;
    }
    put_in_order(log_);
    return std::move(log_);
}

/// A first look at the header, to know which columns the last line must have.
void drop_partial_tip(std::string& text, const RecordLayout& layout, RecordOddities& oddities) {
    SilentProblems silence;
    CsvLines lines(text);
    CsvLine header;
    if (!lines.next(header)) return;
    if (const auto columns = read_tip_header(header, layout, silence.problems()))
        drop_partial_line(text, *columns, layout.csv, oddities);
}

}  // namespace

std::optional<GaugeRecord> read_tip_log(const std::string& name, std::string text,
                                        const RecordLayout& layout, Diagnostics& diagnostics) {
    RecordLayout as_log = layout;
    as_log.csv.gaps_are_dry = true;  // an empty count is no tip
    RecordOddities oddities(name);
    drop_partial_tip(text, as_log, oddities);
    const SourceText source(name, std::move(text));
    CsvProblems problems(source, diagnostics);
    TipLogReader reader(source, as_log, oddities, problems);
    auto log = reader.read();
    problems.close();
    oddities.warn(diagnostics);
    if (!log) return std::nullopt;
    GaugeRecord record;
    record.rain = *std::move(log);
    record.notes.rows = reader.rows();
    oddities.count_into(record.notes);
    return record;
}

}  // namespace rainledger
