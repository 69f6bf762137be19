#include "rain/interval_record.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>
#include <vector>

#include "rain/csv_header.hpp"
#include "rain/csv_opening.hpp"
#include "rain/csv_rows.hpp"
#include "rain/csv_text.hpp"
#include "rain/hyetograph_reading.hpp"
#include "rain/partial_line.hpp"
#include "rain/record_oddities.hpp"
#include "rain/record_order.hpp"

namespace rainledger {
namespace {

/// Looks for what must not reach the reader of hyetographs, by the times of the rows alone. What is
/// wrong with them is for that reader to say.
class Sieve {
public:
    Sieve(CsvColumns columns, const CsvLayout& layout, RecordOddities& oddities)
        : columns_(std::move(columns)), layout_(layout), oddities_(oddities) {
        columns_.has_rain = false;
        zone_ = find_zone(layout, silence_.problems());
    }

    /// Blanks lines of `text` that are left out, so that the others keep their numbers. The rows
    /// that stay.
    std::size_t clean(std::string& text);

private:
    [[nodiscard]] std::vector<LeftOut> look_through(std::string_view text);

    CsvColumns columns_;
    const CsvLayout& layout_;
    RecordOddities& oddities_;
    SilentProblems silence_;
    std::optional<Zone> zone_;
    std::size_t rows_ = 0;
};

std::vector<LeftOut> Sieve::look_through(std::string_view text) {
    CsvLines lines(text);
    CsvLine line;
    if (!lines.next(line)) return {};
    lines.use_separator(columns_.separator);
    const double slack = zone_ && columns_.stamped ? kClockChange_ms : 0.0;
    RecordOrder order(line.text, SameTime::may_repeat, slack, oddities_);
    CsvRowReader reader(columns_, layout_, zone_, silence_.problems());
    CsvRow row;
    while (lines.next(line)) {
        if (order.leaves_out_header(line, lines)) continue;
        if (!reader.read(line, row) || !row.timed) continue;
        const RowTime& time = columns_.start ? row.start : row.end;
        if (order.judge(line, time, lines) == RecordOrder::Verdict::repeated)
            reader.resume_at(order.last());
        else
            ++rows_;
    }
    return order.left_out();
}

std::size_t Sieve::clean(std::string& text) {
    for (const LeftOut& lines : look_through(text)) {
        const auto begin = static_cast<std::size_t>(lines.begin - text.data());
        const auto end = static_cast<std::size_t>(lines.behind.position() - text.data());
        std::replace_if(
            text.begin() + static_cast<std::ptrdiff_t>(begin),
            text.begin() + static_cast<std::ptrdiff_t>(end), [](char c) { return c != '\n'; }, ' ');
    }
    return rows_;
}

/// The columns, if the header can be read.
std::optional<CsvColumns> first_look(const std::string& text, const CsvLayout& layout) {
    SilentProblems silence;
    CsvLines lines(text);
    CsvLine header;
    if (!lines.next(header)) return std::nullopt;
    return read_csv_header(header, layout, silence.problems());
}

}  // namespace

std::optional<GaugeRecord> read_interval_record(const std::string& name, std::string text,
                                                const CsvLayout& layout, Diagnostics& diagnostics) {
    CsvLayout as_record = layout;
    as_record.gaps_are_dry = true;
    RecordOddities oddities(name);
    GaugeRecord record;
    if (auto columns = first_look(text, as_record)) {
        drop_partial_line(text, *columns, as_record, oddities);
        record.notes.rows = Sieve(*std::move(columns), as_record, oddities).clean(text);
    }
    auto rain = read_hyetograph_rows(name, std::move(text), as_record, RowsOf::record, diagnostics);
    oddities.warn(diagnostics);
    if (!rain) return std::nullopt;
    record.rain = *std::move(rain);
    oddities.count_into(record.notes);
    return record;
}

}  // namespace rainledger
