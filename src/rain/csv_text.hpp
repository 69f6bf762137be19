#pragma once

#include <cstddef>
#include <string>
#include <string_view>

#include "rainledger/base/diagnostic.hpp"

// The lines and cells of CSV text, and the problems found in them.
namespace rainledger {

/// Problems of one CSV file. The first twenty errors are listed, the others counted.
class CsvProblems {
public:
    CsvProblems(const SourceText& source, Diagnostics& diagnostics)
        : source_(source), diagnostics_(diagnostics) {}

    void error(std::size_t line, std::size_t column, std::string message, std::string hint = {});
    void warning(std::size_t line, std::size_t column, std::string message, std::string hint = {});
    /// An error about the file as a whole, placed at its beginning.
    void file_error(std::string message, std::string hint = {});
    /// A warning about the file as a whole.
    void file_warning(std::string message, std::string hint = {});
    /// States how many errors were not listed.
    void close();

    [[nodiscard]] bool any_error() const { return errors_ > 0; }
    /// The next error will be listed: its place is worth looking for.
    [[nodiscard]] bool lists_more() const;
    [[nodiscard]] const std::string& file() const { return source_.name(); }

private:
    const SourceText& source_;
    Diagnostics& diagnostics_;
    std::size_t errors_ = 0;
};

struct CsvLine {
    std::string_view text;   ///< without its line end
    std::size_t number = 0;  ///< from 1

    [[nodiscard]] std::size_t column_of(const char* place) const {
        return static_cast<std::size_t>(place - text.data()) + 1;
    }
};

/// Walks the lines that hold something: neither blank nor a `#` comment nor nothing but empty
/// cells.
class CsvLines {
public:
    explicit CsvLines(std::string_view text) : rest_(text) {}
    /// The next such line; false at the end.
    [[nodiscard]] bool next(CsvLine& line);
    /// Sets the separator of cells. Until then each line has its own, see separator_of.
    void use_separator(char separator) { separator_ = separator; }

    /// For who reads lines without next(): where the next line begins and the text ends, and
    /// passing one line whose end has been found.
    [[nodiscard]] const char* position() const { return rest_.data(); }
    [[nodiscard]] const char* end() const { return rest_.data() + rest_.size(); }
    void pass_line(const char* behind) {
        rest_.remove_prefix(static_cast<std::size_t>(behind - rest_.data()));
        ++number_;
    }

private:
    [[nodiscard]] bool says_nothing(std::string_view line) const;

    std::string_view rest_;
    std::size_t number_ = 0;
    char separator_ = '\0';
};

/// The separator that a header row shows: a tab or a semicolon outside quotes is never part of a
/// name.
[[nodiscard]] char separator_of(std::string_view line);

/// How a cell is written.
enum class CellForm {
    sound,
    unclosed_quote,   ///< no closing quote on this line
    text_after_quote  ///< something other than a separator follows the closing quote
};

struct CsvCell {
    std::string_view text;  ///< without quotes and without blanks around it
    const char* begin = nullptr;
    CellForm form = CellForm::sound;
};

/// Cuts the cell that starts at `at` and moves `at` to the separator or line end behind it.
/// `buffer` holds the text of a cell with doubled quotes.
[[nodiscard]] CsvCell cut_cell(const char*& at, const char* end, char separator,
                               std::string& buffer);

/// `text` without blanks and tabs around it.
[[nodiscard]] std::string_view trimmed(std::string_view text);

/// `text` with the letters A to Z small.
[[nodiscard]] std::string lower(std::string_view text);

/// The text in quotes, cut short when it is long.
[[nodiscard]] std::string shown(std::string_view text);

/// What is wrong with a cell whose form is not sound, as message and hint.
void report_form(CsvProblems& problems, const CsvLine& line, const CsvCell& cell);

}  // namespace rainledger
