#include "rain/record_order.hpp"

#include <algorithm>

namespace rainledger {
namespace {

constexpr std::size_t kRowsPerMark = 64;
constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";

}  // namespace

RecordOrder::RecordOrder(std::string_view header, SameTime same_time, double slack,
                         RecordOddities& oddities)
    : header_(header), same_time_(same_time), slack_(slack), oddities_(oddities) {}

/// A second file behind the first may bring its byte-order mark along.
bool RecordOrder::is_header(std::string_view line) const {
    if (line.starts_with(kByteOrderMark)) line.remove_prefix(kByteOrderMark.size());
    return line == header_;
}

bool RecordOrder::leaves_out_header(const CsvLine& line, const CsvLines& lines) {
    if (!is_header(line.text)) return false;
    oddities_.note(Oddity::repeated_header, line, 1, "a header row in the midst is passed over");
    left_out_.push_back({line.text.data(), lines});
    return true;
}

/// The next line that is neither a header nor left out.
bool RecordOrder::next_kept(CsvLines& lines, CsvLine& line) const {
    while (lines.next(line)) {
        if (is_header(line.text)) continue;
        const auto behind =
            std::ranges::upper_bound(left_out_, line.text.data(), {}, &LeftOut::begin);
        if (behind == left_out_.begin()) return true;
        const LeftOut& before = *std::prev(behind);
        if (line.text.data() >= before.behind.position()) return true;
        lines = before.behind;
    }
    return false;
}

/// Looks for an earlier row with the same text; `behind` stands behind it. Rows in a wild order
/// have few marks between them: looking ends when it would take out of proportion to the rows.
bool RecordOrder::find_earlier(const CsvLine& line, double time, CsvLines& behind) {
    auto mark =
        std::ranges::partition_point(marks_, [&](const Mark& m) { return m.time < time - slack_; });
    const auto stop = std::ranges::partition_point(
        marks_, [&](const Mark& m) { return m.time <= time + slack_; });
    if (mark != marks_.begin()) --mark;
    const char* const end = stop == marks_.end() ? line.text.data() : stop->line.text.data();
    CsvLine earlier = mark->line;
    behind = mark->behind;
    for (; earlier.text.data() < end && looked_at_ < kRowsPerMark * kept_; ++looked_at_) {
        if (earlier.text == line.text) return true;
        if (!next_kept(behind, earlier)) return false;
    }
    return false;
}

/// The rows that repeat, from `line` on, those behind `earlier` up to the last above `line`, or 0
/// where they do not. `later` stands behind `line` and is moved behind the rows.
std::size_t RecordOrder::count_repeated(const CsvLine& line, CsvLines earlier,
                                        CsvLines& later) const {
    std::size_t rows = 1;
    CsvLines at = later;
    CsvLine old_row;
    CsvLine new_row;
    while (next_kept(earlier, old_row) && old_row.text.data() < line.text.data()) {
        if (!next_kept(at, new_row)) break;  // the file ends amidst the rows
        if (new_row.text != old_row.text) return 0;
        later = at;
        ++rows;
    }
    later = at;
    return rows;
}

RecordOrder::Verdict RecordOrder::judge(const CsvLine& line, const RowTime& time, CsvLines& lines) {
    const bool may_repeat =
        kept_ > 0 && (time.value < last_.value ||
                      (time.value == last_.value && same_time_ == SameTime::may_repeat));
    if (may_repeat) {
        CsvLines earlier = lines;
        CsvLines behind = lines;
        if (find_earlier(line, time.value, earlier)) {
            if (const std::size_t rows = count_repeated(line, earlier, behind)) {
                oddities_.note_repetition(line, rows);
                left_out_.push_back({line.text.data(), behind});
                lines = behind;
                return Verdict::repeated;
            }
        }
    }
    keep(line, time, lines);
    return may_repeat ? Verdict::back : Verdict::onward;
}

void RecordOrder::keep(const CsvLine& line, const RowTime& time, const CsvLines& lines) {
    const bool newest = marks_.empty() || time.value > marks_.back().time;
    if (marks_.empty() || (newest && ++since_mark_ >= kRowsPerMark)) {
        marks_.push_back({time.value, line, lines});
        since_mark_ = 0;
    }
    ++kept_;
    last_ = time;
}

}  // namespace rainledger
