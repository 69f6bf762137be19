#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "rain/csv_header_cells.hpp"
#include "rain/csv_text.hpp"

// A header row as cells, and the finding of columns in it.
namespace rainledger {

class HeaderLine {
public:
    /// Cuts the row; reports cells whose form is not sound.
    HeaderLine(const CsvLine& line, CsvProblems& problems);

    [[nodiscard]] const std::vector<HeaderCell>& cells() const { return cells_; }
    [[nodiscard]] char separator() const { return separator_; }
    /// Nothing has been reported about this row.
    [[nodiscard]] bool is_sound() const { return sound_; }

    /// The column with this name, in lower case, before its bracket; null if there is none, and a
    /// second one is reported.
    [[nodiscard]] const HeaderCell* called(std::string_view name);
    /// The column with this whole title, else the one with this title before its bracket; it is
    /// reported if there is none or a second.
    [[nodiscard]] const HeaderCell* titled(const std::string& title);
    [[nodiscard]] bool has(std::string_view name) const;

    void error(std::size_t place, std::string message, std::string hint);

private:
    using Found = std::vector<const HeaderCell*>;

    [[nodiscard]] Found all_called(std::string_view name) const;
    [[nodiscard]] const HeaderCell* only(const Found& found);

    const CsvLine& line_;
    CsvProblems& problems_;
    std::vector<HeaderCell> cells_;
    char separator_ = ',';
    bool sound_ = true;
};

}  // namespace rainledger
