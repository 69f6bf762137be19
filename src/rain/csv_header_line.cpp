#include "rain/csv_header_line.hpp"

#include <utility>

#include "rainledger/base/suggest.hpp"

namespace rainledger {

HeaderLine::HeaderLine(const CsvLine& line, CsvProblems& problems)
    : line_(line), problems_(problems), separator_(separator_of(line.text)) {
    const char* at = line.text.data();
    const char* const end = at + line.text.size();
    std::string buffer;
    for (bool more = true; more;) {
        const CsvCell cell = cut_cell(at, end, separator_, buffer);
        if (cell.form != CellForm::sound) {
            sound_ = false;
            report_form(problems, line, cell);
        }
        cells_.push_back(
            take_apart({cells_.size(), line.column_of(cell.begin), std::string(cell.text)}));
        more = at != end;
        if (more) ++at;
    }
}

HeaderLine::Found HeaderLine::all_called(std::string_view name) const {
    Found found;
    for (const HeaderCell& cell : cells_)
        if (cell.name == name) found.push_back(&cell);
    return found;
}

bool HeaderLine::has(std::string_view name) const {
    return !all_called(name).empty();
}

const HeaderCell* HeaderLine::only(const Found& found) {
    if (found.empty()) return nullptr;
    if (found.size() > 1)
        error(found[1]->column.place, "a second column is called " + shown(found[1]->column.title),
              "rename one of the two");
    return found.front();
}

const HeaderCell* HeaderLine::called(std::string_view name) {
    return only(all_called(name));
}

const HeaderCell* HeaderLine::titled(const std::string& title) {
    Found found;
    for (const HeaderCell& cell : cells_)
        if (cell.column.title == title) found.push_back(&cell);
    if (found.empty()) found = all_called(lower(title));
    if (found.empty()) {
        std::vector<std::string_view> known;
        for (const HeaderCell& cell : cells_)
            known.push_back(cell.column.title);
        const auto near = nearest(title, known);
        const std::string guess = near ? "did you mean " + shown(*near) + "? " : "";
        error(1, "there is no column " + shown(title), guess + column_titles(cells_));
    }
    return only(found);
}

void HeaderLine::error(std::size_t place, std::string message, std::string hint) {
    sound_ = false;
    problems_.error(line_.number, place, std::move(message), std::move(hint));
}

}  // namespace rainledger
