#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

// CSV text without quotes, cut into rows and cells.
namespace rainledger {

struct PlainCell {
    std::string_view text;   ///< without blanks around it
    std::size_t column = 1;  ///< in bytes of the line, from 1
};

struct PlainLine {
    std::size_t number = 1;
    std::vector<PlainCell> cells;
};

/// The rows that hold something: no blank lines, no `#` comments, no rows of empty cells. The first
/// row shows the separator: a tab, else a semicolon, else a comma.
struct PlainTable {
    char separator = ',';
    std::vector<PlainLine> lines;
};
[[nodiscard]] PlainTable cut_plain_rows(std::string_view text);

}  // namespace rainledger
