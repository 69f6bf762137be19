#include "rain/csv_header.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <utility>
#include <vector>

#include "rain/csv_header_line.hpp"

namespace rainledger {
namespace {

constexpr std::array kKinds{RainKind::depth, RainKind::intensity, RainKind::cumulative};

std::string_view kind_name(RainKind kind) {
    return kRainNames[static_cast<std::size_t>(kind)];
}

std::optional<RainKind> kind_called(std::string_view name) {
    for (const RainKind kind : kKinds)
        if (kind_name(kind) == name) return kind;
    return std::nullopt;
}

/// Two names of one unit ("h" and "hr", say).
bool same_unit(const std::string& a, const std::string& b) {
    if (a == b) return true;
    for (const Dimension dimension : {Dimension::depth, Dimension::rate, Dimension::time}) {
        const auto first = find_unit(a, dimension);
        const auto second = find_unit(b, dimension);
        if (first && second) return first->to_canonical(1.0) == second->to_canonical(1.0);
    }
    return false;
}

class HeaderReader {
public:
    HeaderReader(const CsvLine& line, const CsvLayout& layout, CsvProblems& problems)
        : header_(line, problems), layout_(layout), file_(problems.file()) {
        columns_.line = line.number;
        columns_.separator = header_.separator();
        columns_.count = header_.cells().size();
    }

    std::optional<CsvColumns> read() {
        if (!header_.is_sound()) return std::nullopt;
        find_time();
        find_rain();
        if (!header_.is_sound()) return std::nullopt;
        return columns_;
    }

private:
    void find_time();
    void take_named_time();
    void take_known_times();
    void take_time(const HeaderCell& cell, StampMeaning meaning);
    void check_stated_meaning();
    void find_time_unit(const HeaderCell& cell);
    void find_rain();
    void take_named_rain();
    void take_known_rain();
    void take_rain(const HeaderCell& cell, RainKind kind);
    /// A unit and a column as the scenario states them, with the keys it uses.
    struct Stated {
        const std::optional<std::string>& unit;
        const std::optional<std::string>& column;
        std::string_view unit_key;
        std::string_view column_key;
    };
    [[nodiscard]] bool may_override(const HeaderCell& cell, const Stated& stated);
    void refuse_rain_unit(const HeaderCell& cell, const std::string& unit, Dimension dimension);

    [[nodiscard]] bool lacks_all(std::span<const std::string_view> names) const;
    [[nodiscard]] std::string way_out(std::span<const std::string_view> known,
                                      std::string_view example) const;

    void error(std::size_t place, std::string message, std::string hint) {
        header_.error(place, std::move(message), std::move(hint));
    }

    HeaderLine header_;
    const CsvLayout& layout_;
    const std::string& file_;
    const HeaderCell* time_cell_ = nullptr;
    CsvColumns columns_;
};

bool HeaderReader::lacks_all(std::span<const std::string_view> names) const {
    return std::ranges::none_of(names, [&](auto name) { return header_.has(name); });
}

std::string HeaderReader::way_out(std::span<const std::string_view> known,
                                  std::string_view example) const {
    LackingColumns lacking;
    lacking.time = !layout_.time_column && lacks_all(kTimeNames);
    lacking.rain = !layout_.rain_column && lacks_all(kRainNames);
    return column_advice(header_.cells(), known, example, file_, lacking);
}

void HeaderReader::find_time() {
    if (layout_.time_column)
        take_named_time();
    else
        take_known_times();
    if (time_cell_ != nullptr) check_stated_meaning();
}

void HeaderReader::take_named_time() {
    const HeaderCell* const cell = header_.titled(*layout_.time_column);
    if (cell == nullptr) return;
    if (cell->name == "start" || cell->name == "end")
        take_time(*cell, cell->name == "start" ? StampMeaning::start : StampMeaning::end);
    else if (layout_.stamp)
        take_time(*cell, *layout_.stamp);
    else
        error(cell->column.place,
              "it is not stated whether " + shown(cell->column.title) +
                  " is the start or the end of a step",
              "state it in the scenario with stamp: start or stamp: end");
}

void HeaderReader::take_known_times() {
    const HeaderCell* const start = header_.called("start");
    const HeaderCell* const end = header_.called("end");
    const HeaderCell* const time = header_.called("time");
    if (time != nullptr && (start != nullptr || end != nullptr)) {
        error(time->column.place, "there are two columns for one time",
              "state which to read in the scenario with time:");
    } else if (time != nullptr && !layout_.stamp) {
        error(time->column.place,
              "it is not stated whether 'time' is the start or the end of a step",
              "state it in the scenario with stamp: start or stamp: end, or call the column "
              "start or end");
    } else if (time != nullptr) {
        take_time(*time, *layout_.stamp);
    } else {
        if (start != nullptr) take_time(*start, StampMeaning::start);
        if (end != nullptr) take_time(*end, StampMeaning::end);
        if (start == nullptr && end == nullptr)
            error(1, "there is no time column",
                  way_out(kTimeNames, "call it 'end [min]', or 'end' for timestamps"));
    }
}

void HeaderReader::take_time(const HeaderCell& cell, StampMeaning meaning) {
    find_time_unit(cell);
    time_cell_ = &cell;
    (meaning == StampMeaning::start ? columns_.start : columns_.end) = cell.column;
}

void HeaderReader::find_time_unit(const HeaderCell& cell) {
    if (!may_override(cell, {layout_.time_unit, layout_.time_column, "time_unit", "time"})) return;
    const auto& unit = layout_.time_unit ? layout_.time_unit : cell.unit;
    const std::string name = unit.value_or("");
    if (time_cell_ != nullptr && name != columns_.time_unit) {
        error(cell.column.place, "start and end are not in the same unit",
              "give both in the same unit, or state which to read in the scenario with time:");
        return;
    }
    columns_.stamped = !unit;
    columns_.time_unit = name;
    if (!unit) return;
    if (const auto known = find_unit(name, Dimension::time))
        columns_.to_h = *known;
    else
        error(cell.column.place, shown(name) + " is not a unit of time",
              unit_guess(name, Dimension::time) + "known here: " +
                  std::string(accepted_units(Dimension::time)) + "; timestamps take no unit");
}

/// Refuses what the scenario states about times when the columns already say it themselves.
void HeaderReader::check_stated_meaning() {
    const std::size_t place = time_cell_->column.place;
    const bool both = columns_.start && columns_.end;
    const bool is_start = time_cell_->name == "start";
    if (both && layout_.every_h)
        error(place, "the rows give their own start and end, and the scenario gives every: too",
              "leave out every:");
    if (both && layout_.stamp)
        error(place, "the rows give their own start and end, and the scenario gives stamp: too",
              "leave out stamp:");
    if (both || !layout_.stamp || (!is_start && time_cell_->name != "end")) return;
    if (is_start != (*layout_.stamp == StampMeaning::start))
        error(place,
              "column " + shown(time_cell_->column.title) +
                  " contradicts the scenario's stamp: " + (is_start ? "end" : "start"),
              "leave out stamp:, or rename the column");
}

void HeaderReader::find_rain() {
    if (layout_.rain_column)
        take_named_rain();
    else
        take_known_rain();
}

void HeaderReader::take_named_rain() {
    const HeaderCell* const cell = header_.titled(*layout_.rain_column);
    if (cell == nullptr) return;
    const auto kind = layout_.kind ? layout_.kind : kind_called(cell->name);
    if (cell == time_cell_)
        error(cell->column.place, "this column is named for both time and rain",
              "name two different columns under time: and rain:");
    else if (kind)
        take_rain(*cell, *kind);
    else
        error(cell->column.place,
              "it is not stated what kind of rain " + shown(cell->column.title) + " holds",
              "state it in the scenario with kind: depth, kind: intensity or kind: cumulative");
}

void HeaderReader::take_known_rain() {
    std::vector<const HeaderCell*> found;
    for (const std::string_view name : kRainNames)
        if (const HeaderCell* const cell = header_.called(name)) found.push_back(cell);
    const auto wanted = [&](const HeaderCell* cell) {
        return layout_.kind && cell->name == kind_name(*layout_.kind);
    };
    const auto chosen = std::find_if(found.begin(), found.end(), wanted);
    if (found.empty()) {
        error(1, "there is no rain column",
              way_out(kRainNames, "call it 'depth [mm]', 'intensity [mm/h]' or 'cumulative [mm]'"));
    } else if (chosen != found.end()) {
        take_rain(**chosen, *layout_.kind);
    } else if (layout_.kind) {
        error(found.front()->column.place,
              "column " + shown(found.front()->column.title) +
                  " contradicts the scenario's kind: " + std::string(kind_name(*layout_.kind)),
              "leave out kind:, or rename the column");
    } else if (found.size() > 1) {
        error(std::max(found[0]->column.place, found[1]->column.place),
              "there are two rain columns, " + shown(found[0]->column.title) + " and " +
                  shown(found[1]->column.title),
              "state which to read in the scenario with rain:");
    } else {
        take_rain(*found.front(), *kind_called(found.front()->name));
    }
}

void HeaderReader::take_rain(const HeaderCell& cell, RainKind kind) {
    columns_.rain = cell.column;
    columns_.kind = kind;
    if (!may_override(cell, {layout_.rain_unit, layout_.rain_column, "unit", "rain"})) return;
    const auto& unit = layout_.rain_unit ? layout_.rain_unit : cell.unit;
    const bool is_rate = kind == RainKind::intensity;
    const Dimension dimension = is_rate ? Dimension::rate : Dimension::depth;
    if (!unit) {
        const std::string name(kind_name(kind));
        const std::string mm = is_rate ? "mm/h" : "mm";
        const std::string in = is_rate ? "in/h" : "in";
        error(cell.column.place, "column " + shown(cell.column.title) + " has no unit",
              "write it in brackets, '" + name + " [" + mm + "]' or '" + name + " [" + in +
                  "]', or state unit: " + mm + " in the scenario");
    } else if (const auto known = find_unit(*unit, dimension)) {
        columns_.rain_unit = *unit;
        columns_.to_mm = *known;
    } else {
        refuse_rain_unit(cell, *unit, dimension);
    }
}

/// A unit for a column that the scenario does not name may fill in a bracket, not replace one.
/// `unit` and `column` are what the scenario states under `unit_key` and `column_key`.
bool HeaderReader::may_override(const HeaderCell& cell, const Stated& stated) {
    if (!stated.unit || stated.column || !cell.unit) return true;
    if (same_unit(*stated.unit, *cell.unit)) return true;
    const std::string unit_key(stated.unit_key);
    error(cell.column.place,
          "column " + shown(cell.column.title) + " is in " + *cell.unit +
              ", but the scenario gives " + unit_key + ": " + *stated.unit,
          "leave out " + unit_key + ":, or name the column too, " + std::string(stated.column_key) +
              ": '" + cell.column.title + "', to replace its bracket");
    return false;
}

void HeaderReader::refuse_rain_unit(const HeaderCell& cell, const std::string& unit,
                                    Dimension dimension) {
    const bool is_rate = dimension == Dimension::rate;
    const Dimension other = is_rate ? Dimension::depth : Dimension::rate;
    const std::string hint =
        find_unit(unit, other)
            ? "rain in " + unit + " is called " + (is_rate ? "depth or cumulative" : "intensity")
            : unit_guess(unit, dimension) + "known here: " + std::string(accepted_units(dimension));
    error(cell.column.place, shown(unit) + " is not a unit of " + (is_rate ? "intensity" : "depth"),
          hint);
}

}  // namespace

std::optional<CsvColumns> read_csv_header(const CsvLine& line, const CsvLayout& layout,
                                          CsvProblems& problems) {
    return HeaderReader(line, layout, problems).read();
}

}  // namespace rainledger
