#include "fieldtest/readings_header.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/suggest.hpp"
#include "rainledger/base/unit_spellings.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 7> kColumns{
    "time", "infiltrated", "drop", "volume_added", "water_level", "pit", "refill"};
constexpr std::array kKinds{ReadingKind::infiltrated, ReadingKind::drop, ReadingKind::volume_added,
                            ReadingKind::water_level};
constexpr std::string_view kReadingExample =
    "call it 'infiltrated [mm]', 'drop [mm]', 'volume_added [mL]' or 'water_level [mm]'";

/// A header cell: "Drop [mm]" is called "drop" and has the unit "mm".
struct Title {
    std::size_t index;
    std::size_t column;
    std::string text;
    std::string name;
    std::string unit;  // empty without a bracket
};

std::string without_blanks_at_end(std::string_view text) {
    while (text.ends_with(' '))
        text.remove_suffix(1);
    return std::string(text);
}

Title title_of(const PlainCell& cell, std::size_t index) {
    Title title{index, cell.column, std::string(cell.text), std::string(cell.text), {}};
    const std::size_t bracket = cell.text.rfind('[');
    if (bracket != std::string_view::npos && cell.text.ends_with(']')) {
        title.name = without_blanks_at_end(cell.text.substr(0, bracket));
        title.unit = std::string(cell.text.substr(bracket + 1, cell.text.size() - bracket - 2));
    }
    for (char& c : title.name) {
        if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
        if (c == ' ') c = '_';
    }
    return title;
}

class HeaderReader {
public:
    HeaderReader(const PlainLine& line, const ReportCell& report) : report_(report) {
        for (std::size_t i = 0; i < line.cells.size(); ++i)
            titles_.push_back(title_of(line.cells[i], i));
        columns_.count = titles_.size();
    }

    std::optional<ReadingColumns> read();

private:
    void refuse_slips();
    void find_time();
    void find_value();
    void find_marks();
    [[nodiscard]] const Title* called(std::string_view name);
    [[nodiscard]] std::optional<Unit> unit_of(const Title& title, Dimension dimension);
    void error(std::size_t column, std::string message, std::string hint) {
        sound_ = false;
        report_(column, std::move(message), std::move(hint));
    }

    const ReportCell& report_;
    std::vector<Title> titles_;
    ReadingColumns columns_;
    bool sound_ = true;
};

const Title* HeaderReader::called(std::string_view name) {
    const Title* found = nullptr;
    for (const Title& title : titles_) {
        if (title.name != name) continue;
        if (found != nullptr)
            error(title.column, "a second column is called " + in_quotes(title.text),
                  "rename one of the two");
        found = &title;
    }
    return found;
}

void HeaderReader::refuse_slips() {
    for (const Title& title : titles_) {
        if (std::ranges::find(kColumns, title.name) != kColumns.end()) continue;
        if (const auto near = nearest(title.name, kColumns))
            error(title.column,
                  "column " + in_quotes(title.text) + " looks like a slip for " + in_quotes(*near),
                  "rename it");
    }
}

std::optional<Unit> HeaderReader::unit_of(const Title& title, Dimension dimension) {
    if (title.unit.empty()) {
        const std::string example(dimension == Dimension::time     ? "min"
                                  : dimension == Dimension::volume ? "mL"
                                                                   : "mm");
        error(title.column, "column " + in_quotes(title.text) + " has no unit",
              "write it in brackets, '" + title.name + " [" + example + "]'");
        return std::nullopt;
    }
    const auto unit = find_unit(title.unit, dimension);
    if (unit) return unit;
    const auto meant = meant_unit(title.unit, dimension);
    error(title.column,
          in_quotes(title.unit) + " is not a unit of " + std::string(dimension_name(dimension)),
          (meant ? "did you mean " + in_quotes(*meant) + "? " : "") +
              "known here: " + std::string(accepted_units(dimension)));
    return std::nullopt;
}

void HeaderReader::find_time() {
    const Title* const time = called("time");
    if (time == nullptr) {
        error(1, "there is no time column", "call it 'time [min]'");
        return;
    }
    columns_.time = time->index;
    columns_.time_unit = time->unit;
    if (const auto unit = unit_of(*time, Dimension::time)) columns_.to_h = *unit;
}

void HeaderReader::find_value() {
    const Title* found = nullptr;
    for (const ReadingKind kind : kKinds) {
        const Title* const title = called(reading_kind_name(kind));
        if (title == nullptr) continue;
        if (found != nullptr) {
            error(std::max(title->column, found->column),
                  "there are two columns of readings, " + in_quotes(found->text) + " and " +
                      in_quotes(title->text),
                  "keep the one that was read, and rename the other");
            return;
        }
        found = title;
        columns_.kind = kind;
    }
    if (found == nullptr) {
        error(1, "there is no column of readings", std::string(kReadingExample));
        return;
    }
    columns_.value = found->index;
    columns_.value_unit = found->unit;
    const bool volumes = columns_.kind == ReadingKind::volume_added;
    if (const auto unit = unit_of(*found, volumes ? Dimension::volume : Dimension::depth))
        columns_.to_canonical = *unit;
}

void HeaderReader::find_marks() {
    if (const Title* const pit = called("pit")) columns_.pit = pit->index;
    if (const Title* const refill = called("refill")) columns_.refill = refill->index;
}

std::optional<ReadingColumns> HeaderReader::read() {
    refuse_slips();
    find_time();
    find_value();
    find_marks();
    if (!sound_) return std::nullopt;
    return columns_;
}

}  // namespace

std::optional<ReadingColumns> read_readings_header(const PlainLine& line,
                                                   const ReportCell& report) {
    return HeaderReader(line, report).read();
}

}  // namespace rainledger
