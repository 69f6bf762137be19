#include "rainledger/fieldtest/readings_csv.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <utility>

#include "fieldtest/plain_rows.hpp"
#include "fieldtest/readings_header.hpp"
#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";
constexpr std::size_t kListedErrors = 20;
constexpr std::array<std::string_view, 4> kMarked{"x", "X", "yes", "1"};
constexpr std::array<std::string_view, 3> kUnmarked{"", "no", "0"};
constexpr std::string_view kExample =
    "a file begins with a row such as 'time [min],drop [mm]', then one row per reading";

/// Reads one file from its first line to its tests.
class ReadingsReader {
public:
    ReadingsReader(const SourceText& source, const std::optional<Rings>& rings,
                   Diagnostics& diagnostics)
        : source_(source),
          rings_(rings),
          diagnostics_(diagnostics),
          table_(cut_plain_rows(source.text())) {}

    std::optional<FieldReadings> read();

private:
    [[nodiscard]] bool read_header();
    void read_row(const PlainLine& line);
    [[nodiscard]] std::optional<double> number_in(const PlainLine& line, std::size_t cell);
    [[nodiscard]] bool refill_in(const PlainLine& line);
    [[nodiscard]] std::string pit_in(const PlainLine& line);
    void report_reduction(const std::vector<ReadingProblem>& problems);
    void error(std::size_t line, std::size_t column, std::string message, std::string hint);
    void state_unlisted();

    const SourceText& source_;
    const std::optional<Rings>& rings_;
    Diagnostics& diagnostics_;
    PlainTable table_;
    ReadingColumns columns_;
    std::vector<ReadingRow> rows_;
    std::vector<const PlainLine*> row_lines_;
    std::size_t errors_ = 0;
};

void ReadingsReader::error(std::size_t line, std::size_t column, std::string message,
                           std::string hint) {
    if (++errors_ <= kListedErrors)
        diagnostics_.error(source_.at(line, column), std::move(message), std::move(hint));
}

void ReadingsReader::state_unlisted() {
    if (errors_ <= kListedErrors) return;
    Place place;
    place.file = source_.name();
    const std::size_t more = errors_ - kListedErrors;
    diagnostics_.error(std::move(place),
                       "and " + std::to_string(more) + " more " + (more == 1 ? "error" : "errors"));
}

bool ReadingsReader::read_header() {
    if (table_.lines.empty()) {
        error(1, 1, "the file holds no rows", std::string(kExample));
        return false;
    }
    const PlainLine& line = table_.lines.front();
    const auto columns =
        read_readings_header(line, [&](std::size_t column, std::string message, std::string hint) {
            error(line.number, column, std::move(message), std::move(hint));
        });
    if (!columns) return false;
    columns_ = *columns;
    if (columns_.kind == ReadingKind::volume_added && !rings_)
        error(line.number, line.cells[columns_.value].column,
              "volumes need the inner ring's diameter to become depths",
              "state it: 'ring: {inner_diameter: 300 mm}' beside 'readings:', or --ring '300 mm'");
    if (table_.lines.size() == 1)
        error(line.number, 1, "there are no rows below the header", std::string(kExample));
    return errors_ == 0;
}

std::optional<double> ReadingsReader::number_in(const PlainLine& line, std::size_t cell) {
    const auto [text, column] = line.cells[cell];
    std::string decimal(text);
    if (table_.separator != ',') std::ranges::replace(decimal, ',', '.');
    const auto value = parse_number(decimal);
    if (value) return value;
    const bool empty = text.empty();
    error(line.number, column, empty ? "this cell is empty" : in_quotes(text) + " is no number",
          empty ? "leave out a row that was not read; a row at time 0 holds 0"
                : "the unit stands in the header alone");
    return std::nullopt;
}

bool ReadingsReader::refill_in(const PlainLine& line) {
    if (!columns_.refill) return false;
    const auto [text, column] = line.cells[*columns_.refill];
    if (std::ranges::find(kMarked, text) != kMarked.end()) return true;
    if (std::ranges::find(kUnmarked, text) == kUnmarked.end())
        error(line.number, column, in_quotes(text) + " is no mark of a refill",
              "write x or yes on the row of the level just after filling, and nothing elsewhere");
    return false;
}

std::string ReadingsReader::pit_in(const PlainLine& line) {
    if (!columns_.pit) return {};
    const auto [text, column] = line.cells[*columns_.pit];
    if (text.empty())
        error(line.number, column, "this row has no pit", "name the pit on every row");
    return std::string(text);
}

void ReadingsReader::read_row(const PlainLine& line) {
    if (line.cells.size() != columns_.count) {
        error(line.number, 1,
              "this row has " + std::to_string(line.cells.size()) + " cells, the header " +
                  std::to_string(columns_.count),
              table_.separator == ',' ? "with a decimal comma, separate the cells by semicolons"
                                      : "");
        return;
    }
    const auto time = number_in(line, columns_.time);
    const auto value = number_in(line, columns_.value);
    ReadingRow row;
    row.pit = pit_in(line);
    row.refill = refill_in(line);
    if (!time || !value || (columns_.pit && row.pit.empty())) return;
    row.time_h = columns_.to_h.to_canonical(*time);
    row.value = columns_.to_canonical.to_canonical(*value);
    rows_.push_back(std::move(row));
    row_lines_.push_back(&line);
}

void ReadingsReader::report_reduction(const std::vector<ReadingProblem>& problems) {
    for (const ReadingProblem& problem : problems) {
        const PlainLine& line = *row_lines_[problem.row];
        std::size_t cell = columns_.value;
        if (problem.cell == ReadingCell::time) cell = columns_.time;
        if (problem.cell == ReadingCell::refill) cell = columns_.refill.value_or(columns_.value);
        error(line.number, line.cells[cell].column, problem.message, problem.hint);
    }
}

std::optional<FieldReadings> ReadingsReader::read() {
    FieldReadings readings;
    if (read_header()) {
        for (std::size_t i = 1; i < table_.lines.size(); ++i)
            read_row(table_.lines[i]);
        // A level that could not be read would make its neighbours look wrong.
        const bool whole = errors_ == 0 || columns_.kind != ReadingKind::water_level;
        ReducedReadings reduced;
        if (whole) reduced = reduce_readings(rows_, columns_.kind, rings_);
        report_reduction(reduced.problems);
        readings = {columns_.kind, columns_.time_unit, columns_.value_unit,
                    std::move(reduced.tests)};
    }
    state_unlisted();
    if (errors_ > 0) return std::nullopt;
    return readings;
}

}  // namespace

std::optional<FieldReadings> read_readings_csv(const std::string& name, std::string text,
                                               const std::optional<Rings>& rings,
                                               Diagnostics& diagnostics) {
    if (text.starts_with(kByteOrderMark)) text.erase(0, kByteOrderMark.size());
    const SourceText source(name, std::move(text));
    return ReadingsReader(source, rings, diagnostics).read();
}

}  // namespace rainledger
