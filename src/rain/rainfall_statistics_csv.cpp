#include <algorithm>
#include <cstddef>
#include <limits>
#include <span>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "rain/csv_text.hpp"
#include "rain/statistics_labels.hpp"
#include "rain/statistics_rows.hpp"
#include "rain/statistics_table.hpp"
#include "rainledger/base/cut.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kLooks = 200;  // lines in which a table of statistics shows itself

std::string_view without_mark(std::string_view text) {
    constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";
    return text.starts_with(kByteOrderMark) ? text.substr(kByteOrderMark.size()) : text;
}

/// The lines that hold something, at most so many.
std::vector<CsvLine> lines_of(std::string_view text, std::size_t most) {
    CsvLines walk(text);
    std::vector<CsvLine> lines;
    CsvLine line;
    while (lines.size() < most && walk.next(line))
        lines.push_back(line);
    return lines;
}

/// The lines that may state the unit of a block: those above the first one, and its own heading.
std::vector<CsvLine> lines_above(const StatisticsLayout& layout, const StatisticsBlock& block) {
    std::vector<CsvLine> above = layout.preamble;
    if (!block.heading.empty() && &block != &layout.blocks.front())
        above.push_back({block.heading, block.heading_line});
    return above;
}

/// Finds the table in a file and reads it.
class StatisticsReader {
public:
    StatisticsReader(const SourceText& source, CsvProblems& problems)
        : source_(source), problems_(problems) {}

    std::optional<RainfallStatistics> read();

private:
    void report_no_header(std::span<const CsvLine> lines);
    void report_no_rows(const StatisticsBlock& block);
    void report_strays();
    [[nodiscard]] const StatisticsBlock* chosen_block();
    [[nodiscard]] std::vector<std::string> set_aside(const StatisticsBlock& chosen) const;

    const SourceText& source_;
    CsvProblems& problems_;
    StatisticsLayout layout_;
};

void StatisticsReader::report_no_header(std::span<const CsvLine> lines) {
    const auto turned = std::ranges::find_if(lines, is_row_of_durations);
    if (turned != lines.end()) {
        problems_.error(turned->number, 1,
                        "durations stand across here, in place of return periods",
                        "turn the table round: a row per duration, a column per return period");
        return;
    }
    const bool utf16 =
        source_.text().starts_with("\xFF\xFE") || source_.text().starts_with("\xFE\xFF");
    problems_.file_error(
        "there is no row of return periods in this file",
        utf16 ? "the file is UTF-16 text; save it as UTF-8"
              : "a table begins with a row such as 'duration,2 yr [mm],10 yr [mm],100 yr [mm]', "
                "then one row per duration: '5 min,8.2,12.5,18.6'");
}

/// Rows that were meant as such are told as strays.
void StatisticsReader::report_no_rows(const StatisticsBlock& block) {
    if (!block.rows.empty() || !layout_.strays.empty()) return;
    problems_.error(block.header.line.number, 1, "there are no rows of depths below this one",
                    "write a row per duration: '5 min' and its depths");
}

void StatisticsReader::report_strays() {
    for (const StatisticsRow& row : layout_.strays) {
        if (row.unsound) {
            report_form(problems_, row.line, *row.unsound);
            continue;
        }
        const bool apart = duration_in(row.label()).has_value();
        problems_.error(row.line.number, 1,
                        apart ? "this row stands apart from the table above it"
                              : shown(row.label()) + " is not a duration",
                        apart ? "take out the line between, or repeat the row of return periods "
                                "above a further block"
                              : "write durations as '5 min', '60-min', '24-hr' or '2 d'");
    }
}

const StatisticsBlock* StatisticsReader::chosen_block() {
    const auto& blocks = layout_.blocks;
    if (blocks.size() == 1) return &blocks.front();
    const auto estimates = std::ranges::find(blocks, false, &StatisticsBlock::is_confidence_limit);
    if (estimates != blocks.end()) return &*estimates;
    problems_.error(blocks.front().header.line.number, 1,
                    "every block of this file is headed as one of confidence limits",
                    "take out the blocks that are, and the heading of the one that is not");
    return nullptr;
}

std::vector<std::string> StatisticsReader::set_aside(const StatisticsBlock& chosen) const {
    std::vector<std::string> out;
    for (const StatisticsBlock& block : layout_.blocks)
        if (&block != &chosen)
            out.push_back("a block " +
                          (block.heading.empty() ? "without a heading"
                                                 : "headed " + in_quotes(block.heading)) +
                          " at line " + std::to_string(block.heading_line));
    return out;
}

std::optional<RainfallStatistics> StatisticsReader::read() {
    const auto lines = lines_of(source_.text(), std::numeric_limits<std::size_t>::max());
    layout_ = find_statistics_blocks(lines);
    if (layout_.blocks.empty()) {
        report_no_header(lines);
        return std::nullopt;
    }
    const StatisticsBlock* const block = chosen_block();
    if (block == nullptr) return std::nullopt;
    RainfallStatistics table =
        read_statistics_table(*block, lines_above(layout_, *block), problems_);
    report_no_rows(*block);
    report_strays();
    if (problems_.any_error()) return std::nullopt;
    table.set_aside = set_aside(*block);
    return table;
}

}  // namespace

std::optional<RainfallStatistics> read_rainfall_statistics_csv(const std::string& name,
                                                               std::string text,
                                                               Diagnostics& diagnostics) {
    text.erase(0, text.size() - without_mark(text).size());
    const SourceText source(name, std::move(text));
    CsvProblems problems(source, diagnostics);
    auto table = StatisticsReader(source, problems).read();
    problems.close();
    return table;
}

bool looks_like_statistics(const std::string& text) {
    const auto lines = lines_of(without_mark(text), kLooks);
    return !find_statistics_blocks(lines).blocks.empty() ||
           std::ranges::any_of(lines, is_row_of_depths) ||
           std::ranges::any_of(lines, is_row_of_durations);
}

}  // namespace rainledger
