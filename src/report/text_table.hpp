#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace rainledger {

/// Where a column's cells stand.
enum class Align {
    left,
    right,
    point,  ///< numbers with their decimal points below one another
};

/// A plain table: headings (a '|' in a heading begins its next line), a thin rule, rows. Columns
/// are as wide as their widest cell, counted in code points; two blanks lie between them.
class TextTable {
public:
    void column(std::string_view heading, Align align);
    /// One cell per column; missing cells at the end are empty.
    void row(std::vector<std::string> cells);
    /// A rule between the rows before and after.
    void rule();

    /// The table, each line after two blanks and without blanks at its end.
    [[nodiscard]] std::string text() const;

private:
    struct Column {
        std::vector<std::string> heading;  // lines
        Align align = Align::left;
    };
    struct Widths {
        std::size_t whole = 0;        // of the column
        std::size_t after_point = 0;  // the point and what follows it
    };

    [[nodiscard]] Widths widths(std::size_t column) const;
    [[nodiscard]] std::string heading_cell(std::size_t column, std::size_t line, std::size_t lines,
                                           const Widths& widths) const;
    [[nodiscard]] std::string placed(const std::string& cell, std::size_t column,
                                     const Widths& widths) const;

    std::vector<Column> columns_;
    std::vector<std::vector<std::string>> rows_;  // an empty row is a rule
};

/// Code points of UTF-8 text.
[[nodiscard]] std::size_t shown_width(std::string_view text);

/// `lead` and `text`, broken after the commas and semicolons of `text` into lines of at most
/// `width`, each ending in a newline; the second and later lines begin with `indent` blanks. A
/// phrase longer than a line stands alone on its own.
[[nodiscard]] std::string wrapped(std::string lead, std::string_view text, std::size_t width,
                                  std::size_t indent);

}  // namespace rainledger
