#include "rain/record_oddities.hpp"

#include <algorithm>
#include <string_view>
#include <vector>

namespace rainledger {
namespace {

/// What to do or to know, by Oddity.
constexpr std::array<std::string_view, 6> kHints{
    "two quick tips within the logger's resolution, or a row written twice: then take one out",
    "downloads of a logger that was not emptied overlap in this way",
    "the logger's clock was set back, or files were put together out of order; check the times of "
    "the rows around here",
    "what fell between the last reading before and the restart is not known",
    "a logger that starts again, or a second file behind the first, brings its own",
    "a row that is whole ends with a line end"};

std::string rows_text(std::size_t rows) {
    return std::to_string(rows) + (rows == 1 ? " row" : " rows");
}

}  // namespace

void RecordOddities::note(Oddity oddity, const CsvLine& line, std::size_t column,
                          const std::string& what) {
    Kind& kind = kinds_[static_cast<std::size_t>(oddity)];
    if (++kind.times > 1) return;
    kind.first = {file_, line.number, column, std::string(line.text)};
    kind.what = what;
}

void RecordOddities::note_repetition(const CsvLine& line, std::size_t rows) {
    note(Oddity::repeated_rows, line, 1,
         rows_text(rows) + " from here on " +
             (rows == 1 ? "repeats an earlier one" : "repeat earlier ones") + " and " +
             (rows == 1 ? "is" : "are") + " left out");
    repeated_rows_ += rows;
}

void RecordOddities::warn(Diagnostics& diagnostics) const {
    std::vector<std::size_t> met;
    for (std::size_t i = 0; i < kKinds; ++i)
        if (kinds_[i].times > 0) met.push_back(i);
    std::ranges::stable_sort(met, {}, [&](std::size_t i) { return kinds_[i].first.line; });
    for (const std::size_t i : met) {
        const Kind& kind = kinds_[i];
        std::string in_all;
        if (kind.times > 1) in_all = "; " + std::to_string(kind.times) + " times in all";
        if (kind.times > 1 && i == static_cast<std::size_t>(Oddity::repeated_rows))
            in_all += ", " + rows_text(repeated_rows_);
        diagnostics.warning(kind.first, kind.what + in_all, std::string(kHints[i]));
    }
}

void RecordOddities::count_into(RecordNotes& notes) const {
    notes.same_instant = kind(Oddity::same_instant).times;
    notes.repeated_rows = repeated_rows_;
    notes.clock_set_back = kind(Oddity::clock_set_back).times;
    notes.counter_restarts = kind(Oddity::counter_restart).times;
    notes.repeated_headers = kind(Oddity::repeated_header).times;
    notes.partial_last_line = kind(Oddity::partial_last_line).times > 0;
}

}  // namespace rainledger
