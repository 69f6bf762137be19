#include "rain/statistics_table.hpp"

#include <cmath>
#include <cstddef>
#include <limits>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include "rain/log_interpolation.hpp"
#include "rain/statistics_labels.hpp"
#include "rain/statistics_unit.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kUnread = std::numeric_limits<double>::quiet_NaN();
constexpr const char* kEveryColumn =
    "give a value to each column of the header; leave out a duration that lacks one";

/// What to write in place of a cell that holds no number.
std::string number_hint(const std::string& text) {
    if (parse_quantity(text, Dimension::depth).value || parse_quantity(text, Dimension::rate).value)
        return "the unit stands once, in the header";
    if (text.find_first_of("0123456789") == std::string::npos) return kEveryColumn;
    if (text.find(',') != std::string::npos)
        return "write digits with a decimal point, without marks for thousands";
    return "write digits alone, such as 12.5";
}

/// How to give durations their unit; `label` is the first cell of the header.
std::string duration_unit_hint(std::string_view label) {
    return lower(label).find("return") != std::string::npos
               ? "rows are durations, '5 min', and columns return periods: write the unit in each "
                 "row, or turn the table round"
               : "name it in the header, 'duration [min]', or in each row, '5 min'";
}

/// What to write in place of a cell that holds no return period.
std::string period_hint(std::string_view text) {
    return text.find('%') != std::string_view::npos
               ? "write it in years, which is one over the chance of a year: 10 % is '10 yr'"
               : "write return periods in years: '10', '10 yr', '10-year'";
}

/// Reads the durations and the values of one block.
class TableReader {
public:
    TableReader(const StatisticsBlock& block, CsvProblems& problems)
        : block_(block), problems_(problems) {}

    void read_header(std::span<const CsvLine> above);
    void read_rows();
    [[nodiscard]] RainfallStatistics take_table() { return std::move(table_); }

private:
    /// The row above, for comparison; its depths are NaN where they could not be read.
    struct RowAbove {
        std::string duration;
        std::vector<std::string> written;
        std::vector<double> depth_mm;
    };

    void read_period(const StatisticsCell& cell);
    [[nodiscard]] std::optional<double> read_duration(const StatisticsRow& row);
    void read_row(const StatisticsRow& row);
    [[nodiscard]] bool counts_fit(const StatisticsRow& row);
    /// Without a unit, the value itself, so that the others can be judged.
    [[nodiscard]] double depth_of_value(double value, double duration_h) const {
        if (!unit_) return value;
        return unit_->unit.to_canonical(value) * (unit_->is_rate ? duration_h : 1.0);
    }
    [[nodiscard]] double read_value(const StatisticsRow& row, std::size_t column,
                                    double duration_h);
    void check_against_column_before(const StatisticsRow& row, std::size_t column,
                                     std::vector<double>& depths);
    void check_against_row_above(const StatisticsRow& row, std::size_t column,
                                 std::vector<double>& depths);
    /// A value as its table has it: "12.5 mm".
    [[nodiscard]] std::string with_unit(const std::string& text) const {
        return unit_ ? text + " " + unit_->name : text;
    }
    /// The return period of a column, as its header has it: "10 yr".
    [[nodiscard]] std::string period_label(std::size_t column) const {
        const std::string_view name = take_apart_label(block_.header.cells[column].text).name;
        const auto period = period_in(name);
        return period ? shortest(period->years) + " yr" : shown(name);
    }
    void error(const StatisticsRow& row, std::size_t cell, std::string message, std::string hint) {
        problems_.error(row.line.number, row.cells[cell].column, std::move(message),
                        std::move(hint));
    }

    const StatisticsBlock& block_;
    CsvProblems& problems_;
    RainfallStatistics table_;
    std::optional<Unit> time_unit_;
    bool asked_for_time_unit_ = false;
    std::optional<ValueUnit> unit_;
    bool columns_compare_ = true;  ///< return periods rise, and values have one unit
    RowAbove above_;
};

void TableReader::read_header(std::span<const CsvLine> above) {
    const StatisticsRow& header = block_.header;
    if (header.unsound) report_form(problems_, header.line, *header.unsound);
    const LabelParts label = take_apart_label(header.label());
    time_unit_ = time_unit_of(label.unit ? *label.unit : label.name);
    if (!is_list_header(header))
        for (std::size_t i = 1; i < header.cells.size(); ++i)
            read_period(header.cells[i]);
    if (!time_unit_ && block_.units) time_unit_ = time_unit_of(unit_part(block_.units->label()));
    const StatedUnit stated = unit_of_values(above, block_, problems_);
    unit_ = stated.unit;
    columns_compare_ = columns_compare_ && !stated.contradictory;
}

void TableReader::read_period(const StatisticsCell& cell) {
    const std::size_t line = block_.header.line.number;
    const auto period = period_in(take_apart_label(cell.text).name);
    auto& periods = table_.return_period_yr;
    if (!period) {
        problems_.error(line, cell.column,
                        cell.text.empty() ? "the return period is missing here"
                                          : shown(cell.text) + " is not a return period",
                        period_hint(cell.text));
    } else if (!(period->years >= 1.0)) {
        problems_.error(line, cell.column,
                        "a return period of " + shortest(period->years) + " yr is below 1 yr",
                        "return periods are in years, from 1 on");
    } else if (!periods.empty() && !(period->years > periods.back())) {
        problems_.error(line, cell.column,
                        "return periods must rise, but " + shortest(period->years) +
                            " yr comes after " + shortest(periods.back()) + " yr",
                        "write each return period once, the shortest first");
        columns_compare_ = false;
    } else {
        periods.push_back(period->years);
    }
}

void TableReader::read_rows() {
    for (const StatisticsRow& row : block_.rows)
        read_row(row);
}

std::optional<double> TableReader::read_duration(const StatisticsRow& row) {
    const auto label = duration_in(row.label());
    if (!label->unit && !time_unit_) {
        if (!asked_for_time_unit_)
            error(row, 0, "duration " + shown(row.label()) + " has no unit",
                  duration_unit_hint(block_.header.label()));
        asked_for_time_unit_ = true;
        return std::nullopt;
    }
    const Unit unit = label->unit ? *label->unit : *time_unit_;
    const double hours = unit.to_canonical(label->value);
    if (!(hours > 0.0) || !std::isfinite(hours)) {
        error(row, 0, "duration " + shown(row.label()) + " is out of range",
              "check its digits and its unit");
        return std::nullopt;
    }
    auto& durations = table_.duration_h;
    if (!durations.empty() &&
        (hours < durations.back() || is_same_coordinate(hours, durations.back()))) {
        error(row, 0,
              "durations must rise, but " + duration_label(hours) + " comes after " +
                  duration_label(durations.back()),
              "write each duration once, the shortest first");
        return std::nullopt;
    }
    durations.push_back(hours);
    return hours;
}

bool TableReader::counts_fit(const StatisticsRow& row) {
    const std::size_t wanted = block_.header.cells.size();
    if (row.cells.size() == wanted) return true;
    if (row.cells.size() > wanted)
        error(row, wanted, "there are more values in this row than columns in the header",
              "give a value to each column of the header, and no more");
    else
        error(row, row.cells.size() - 1,
              "this row ends after " + std::to_string(row.cells.size() - 1) + " of " +
                  std::to_string(wanted - 1) + " values",
              kEveryColumn);
    return false;
}

void TableReader::read_row(const StatisticsRow& row) {
    if (row.unsound) return report_form(problems_, row.line, *row.unsound);
    const auto duration_h = read_duration(row);
    const bool fits = counts_fit(row);
    if (!duration_h || !fits) return;
    RowAbove here{duration_label(*duration_h), {}, {}};
    for (std::size_t i = 1; i < row.cells.size(); ++i) {
        here.written.push_back(with_unit(row.cells[i].text));
        here.depth_mm.push_back(read_value(row, i, *duration_h));
        check_against_column_before(row, i, here.depth_mm);
        check_against_row_above(row, i, here.depth_mm);
    }
    table_.depth_mm.insert(table_.depth_mm.end(), here.depth_mm.begin(), here.depth_mm.end());
    above_ = std::move(here);
}

double TableReader::read_value(const StatisticsRow& row, std::size_t column, double duration_h) {
    const std::string& text = row.cells[column].text;
    const auto value = parse_number(text);
    if (text.empty()) {
        error(row, column, "the value is missing here", kEveryColumn);
    } else if (!value) {
        error(row, column, shown(text) + " is not a number", number_hint(text));
    } else if (!(*value > 0.0)) {
        error(row, column, "a value must be above zero, not " + shortest(*value),
              "leave out a duration or a return period that has no value");
    } else {
        const double depth_mm = depth_of_value(*value, duration_h);
        if (depth_mm > 0.0 && std::isfinite(depth_mm)) return depth_mm;
        error(row, column, shown(text) + " is out of range",
              "check its digits and the unit of the table");
    }
    return kUnread;
}

/// Raises a depth that is below another by the rounding of a conversion alone; false if it is
/// below by more.
bool reaches(double& depth_mm, double other_mm) {
    if (depth_mm < other_mm * (1.0 - kSameCoordinate)) return false;
    if (depth_mm < other_mm) depth_mm = other_mm;
    return true;
}

void TableReader::check_against_column_before(const StatisticsRow& row, std::size_t column,
                                              std::vector<double>& depths) {
    if (column < 2 || !columns_compare_ || reaches(depths[column - 1], depths[column - 2])) return;
    error(row, column,
          "depth falls with return period: " + with_unit(row.cells[column].text) + " for " +
              period_label(column) + " is less than " + with_unit(row.cells[column - 1].text) +
              " for " + period_label(column - 1),
          "rarer rain is deeper; check both values");
}

void TableReader::check_against_row_above(const StatisticsRow& row, std::size_t column,
                                          std::vector<double>& depths) {
    if (!unit_ || above_.depth_mm.empty() ||
        reaches(depths[column - 1], above_.depth_mm[column - 1]))
        return;
    error(row, column,
          "depth falls with duration: " + with_unit(row.cells[column].text) + " over " +
              duration_label(table_.duration_h.back()) + " is less rain than " +
              above_.written[column - 1] + " over " + above_.duration,
          unit_->is_rate ? "check both values; intensities of few digits can do this, so take a "
                           "table of depths where there is one"
                         : "a longer duration holds the shorter one; check both values");
}

}  // namespace

RainfallStatistics read_statistics_table(const StatisticsBlock& block,
                                         std::span<const CsvLine> above, CsvProblems& problems) {
    TableReader reader(block, problems);
    reader.read_header(above);
    reader.read_rows();
    return reader.take_table();
}

}  // namespace rainledger
