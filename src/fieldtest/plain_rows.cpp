#include "fieldtest/plain_rows.hpp"

#include <algorithm>

namespace rainledger {
namespace {

constexpr std::string_view kBlanks = " \t\r";

PlainCell cell_of(std::string_view line, std::size_t begin, std::size_t end) {
    while (begin < end && kBlanks.find(line[begin]) != std::string_view::npos)
        ++begin;
    while (end > begin && kBlanks.find(line[end - 1]) != std::string_view::npos)
        --end;
    return {line.substr(begin, end - begin), begin + 1};
}

std::vector<PlainCell> cells_of(std::string_view line, char separator) {
    std::vector<PlainCell> cells;
    std::size_t begin = 0;
    while (true) {
        const std::size_t end = std::min(line.find(separator, begin), line.size());
        cells.push_back(cell_of(line, begin, end));
        if (end == line.size()) return cells;
        begin = end + 1;
    }
}

char separator_in(std::string_view header) {
    for (const char separator : {'\t', ';'})
        if (header.find(separator) != std::string_view::npos) return separator;
    return ',';
}

}  // namespace

PlainTable cut_plain_rows(std::string_view text) {
    PlainTable table;
    std::size_t number = 0;
    while (!text.empty()) {
        const std::size_t end = std::min(text.find('\n'), text.size());
        const std::string_view line = text.substr(0, end);
        text.remove_prefix(std::min(end + 1, text.size()));
        ++number;
        const std::size_t first = line.find_first_not_of(kBlanks);
        if (first == std::string_view::npos || line[first] == '#') continue;
        if (table.lines.empty()) table.separator = separator_in(line);
        PlainLine row{number, cells_of(line, table.separator)};
        const bool empty =
            std::ranges::all_of(row.cells, [](const PlainCell& cell) { return cell.text.empty(); });
        if (!empty) table.lines.push_back(std::move(row));
    }
    return table;
}

}  // namespace rainledger
