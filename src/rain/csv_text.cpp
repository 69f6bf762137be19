#include "rain/csv_text.hpp"

#include <algorithm>
#include <cstring>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kListedErrors = 20;

/// The next line of `rest`, which is not empty, without its line end.
std::string_view take_line(std::string_view& rest) {
    const void* newline = std::memchr(rest.data(), '\n', rest.size());
    const std::size_t length =
        newline == nullptr
            ? rest.size()
            : static_cast<std::size_t>(static_cast<const char*>(newline) - rest.data());
    std::string_view line = rest.substr(0, length);
    rest.remove_prefix(std::min(length + 1, rest.size()));
    if (line.ends_with('\r')) line.remove_suffix(1);
    return line;
}

Place whole_file(const SourceText& source) {
    Place place;
    place.file = source.name();
    return place;
}

bool is_blank(char c, char separator) {
    return c == ' ' || (c == '\t' && separator != '\t');
}

/// The inside of the quoted cell whose opening quote is at `at`; moves `at` behind the closing one.
CsvCell cut_quoted(const char*& at, const char* end, std::string& buffer) {
    CsvCell cell;
    cell.begin = at;
    const char* const inside = ++at;
    bool doubled = false;
    while (at != end && (*at != '"' || (at + 1 != end && at[1] == '"'))) {
        doubled = doubled || *at == '"';
        at += *at == '"' ? 2 : 1;
    }
    if (at == end) {
        cell.form = CellForm::unclosed_quote;
        return cell;
    }
    cell.text = {inside, static_cast<std::size_t>(at - inside)};
    ++at;
    if (!doubled) return cell;
    buffer.clear();
    for (std::size_t i = 0; i < cell.text.size(); ++i) {
        buffer.push_back(cell.text[i]);
        if (cell.text[i] == '"') ++i;
    }
    cell.text = buffer;
    return cell;
}

}  // namespace

void CsvProblems::error(std::size_t line, std::size_t column, std::string message,
                        std::string hint) {
    if (++errors_ <= kListedErrors)
        diagnostics_.error(source_.at(line, column), std::move(message), std::move(hint));
}

void CsvProblems::warning(std::size_t line, std::size_t column, std::string message,
                          std::string hint) {
    diagnostics_.warning(source_.at(line, column), std::move(message), std::move(hint));
}

void CsvProblems::file_error(std::string message, std::string hint) {
    if (++errors_ <= kListedErrors)
        diagnostics_.error(source_.at(1, 1), std::move(message), std::move(hint));
}

void CsvProblems::file_warning(std::string message, std::string hint) {
    diagnostics_.warning(whole_file(source_), std::move(message), std::move(hint));
}

bool CsvProblems::lists_more() const {
    return errors_ < kListedErrors;
}

void CsvProblems::close() {
    if (errors_ <= kListedErrors) return;
    const std::size_t more = errors_ - kListedErrors;
    diagnostics_.error(whole_file(source_),
                       "and " + std::to_string(more) + " more " + (more == 1 ? "error" : "errors"));
}

bool CsvLines::next(CsvLine& line) {
    while (!rest_.empty()) {
        line.text = take_line(rest_);
        line.number = ++number_;
        if (!says_nothing(line.text)) return true;
    }
    return false;
}

bool CsvLines::says_nothing(std::string_view line) const {
    constexpr std::string_view kOfEmptyCells = " \t\",;";
    const std::size_t first = line.find_first_not_of(" \t");
    if (first == std::string_view::npos || line[first] == '#') return true;
    const bool may_be_empty = line[first] == ',' || line[first] == ';' || line[first] == '"';
    if (!may_be_empty || line.find_first_not_of(kOfEmptyCells, first) != std::string_view::npos)
        return false;
    const char separator = separator_ == '\0' ? separator_of(line) : separator_;
    const char* at = line.data();
    const char* const end = at + line.size();
    std::string buffer;
    while (true) {
        const CsvCell cell = cut_cell(at, end, separator, buffer);
        if (!cell.text.empty() || cell.form != CellForm::sound) return false;
        if (at == end) return true;
        ++at;
    }
}

char separator_of(std::string_view line) {
    bool quoted = false;
    char separator = ',';
    for (const char c : line) {
        if (c == '"') quoted = !quoted;
        if (quoted) continue;
        if (c == '\t') return c;
        if (c == ';') separator = c;
    }
    return separator;
}

CsvCell cut_cell(const char*& at, const char* end, char separator, std::string& buffer) {
    while (at != end && is_blank(*at, separator))
        ++at;
    CsvCell cell;
    if (at != end && *at == '"') {
        cell = cut_quoted(at, end, buffer);
        const char* const closed = at;
        at = std::find(at, end, separator);
        const bool more = std::any_of(closed, at, [&](char c) { return !is_blank(c, separator); });
        if (more) cell.form = CellForm::text_after_quote;
    } else {
        cell.begin = at;
        at = std::find(at, end, separator);
        cell.text = {cell.begin, static_cast<std::size_t>(at - cell.begin)};
    }
    cell.text = trimmed(cell.text);
    return cell;
}

std::string_view trimmed(std::string_view text) {
    const std::size_t first = text.find_first_not_of(" \t");
    if (first == std::string_view::npos) return {};
    return text.substr(first, text.find_last_not_of(" \t") - first + 1);
}

std::string lower(std::string_view text) {
    std::string out(text);
    for (char& c : out)
        if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
    return out;
}

std::string shown(std::string_view text) {
    constexpr std::size_t kMostShown = 40;
    return in_quotes(text, kMostShown);
}

void report_form(CsvProblems& problems, const CsvLine& line, const CsvCell& cell) {
    const std::size_t column = line.column_of(cell.begin);
    if (cell.form == CellForm::unclosed_quote)
        problems.error(line.number, column, "the quote that opens here is not closed on this line",
                       "a cell in quotes ends with a quote; a quote inside it is doubled");
    else
        problems.error(line.number, column, "there is text behind the closing quote of this cell",
                       "a quote inside a quoted cell is doubled");
}

std::size_t header_line(std::string_view text) {
    constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";
    if (text.starts_with(kByteOrderMark)) text.remove_prefix(kByteOrderMark.size());
    CsvLines lines(text);
    CsvLine header;
    return lines.next(header) ? header.number : 0;
}

}  // namespace rainledger
