#include "rain/hyetograph_checks.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kListedWarnings = 5;
constexpr double kLongStep = 3.0;  // times the median
constexpr double kLargest = 1e12;
constexpr double kMillisecond_h = 1.0 / 3.6e6;
// Edges such as 0.003 s and 0.002 s differ by a little less than they say.
constexpr double kShortestStep_h = kMillisecond_h * (1.0 - 1e-6);

std::string minutes_text(double hours) {
    return shortest(std::round(hours * 60.0 * 1000.0) / 1000.0) + " min";
}

/// "+01:00"
std::string offset_text(int minutes) {
    const auto two_digits = [](int number) {
        return (number < 10 ? "0" : "") + std::to_string(number);
    };
    const int size = std::abs(minutes);
    return (minutes < 0 ? "-" : "+") + two_digits(size / 60) + ":" + two_digits(size % 60);
}

class StepChecker {
public:
    StepChecker(const Hyetograph& rain, const CsvSteps& steps, const CsvColumns& columns,
                std::string_view text, CsvProblems& problems)
        : rain_(rain), steps_(steps), columns_(columns), text_(text), problems_(problems) {}

    void check_sizes();
    void warn_of_long_steps();
    void warn_of_clock_changes();

private:
    void check_size(std::size_t step);
    void error(std::size_t step, const CsvColumn& column, std::string message, std::string hint);
    void warn(std::size_t step, std::string message, std::string hint);
    void count_unlisted(std::string_view which);
    [[nodiscard]] int offset_change(std::size_t step) const;
    [[nodiscard]] std::string change_text(std::size_t step) const;
    [[nodiscard]] std::pair<std::size_t, std::size_t> place_of(std::size_t step,
                                                               const CsvColumn& column) const;

    const Hyetograph& rain_;
    const CsvSteps& steps_;
    const CsvColumns& columns_;
    std::string_view text_;
    CsvProblems& problems_;
    std::size_t warnings_ = 0;
};

void StepChecker::check_sizes() {
    for (std::size_t i = 0; i < rain_.steps(); ++i) {
        const double duration_h = rain_.duration_h[i];
        const double depth_mm = rain_.depth_mm[i];
        // Written so that what is no number fails too.
        const bool sound = duration_h >= kShortestStep_h && depth_mm <= kLargest &&
                           depth_mm <= kLargest * duration_h &&
                           std::abs(rain_.edges_h[i]) <= kLargest &&
                           std::abs(rain_.edges_h[i + 1]) <= kLargest;
        if (!sound) check_size(i);
    }
}

void StepChecker::check_size(std::size_t step) {
    const bool in_range =
        std::abs(rain_.edges_h[step]) <= kLargest && std::abs(rain_.edges_h[step + 1]) <= kLargest;
    if (!in_range)
        error(step, columns_.first_time(), "this time is too large to compute with, over 1e12 h",
              "check the times and their unit");
    else if (!(rain_.duration_h[step] >= kShortestStep_h))
        error(step, columns_.first_time(), "this step is shorter than 1 ms",
              "check the times and their unit");
    else
        error(step, columns_.rain,
              "this rain is too large to compute with, over 1e12 mm or 1e12 mm/h",
              "check the number and its unit");
}

void StepChecker::error(std::size_t step, const CsvColumn& column, std::string message,
                        std::string hint) {
    // An error that is only counted needs no place.
    const auto [line, place] =
        problems_.lists_more() ? place_of(step, column) : std::pair{0UL, 0UL};
    problems_.error(line, place, std::move(message), std::move(hint));
}

void StepChecker::warn(std::size_t step, std::string message, std::string hint) {
    if (++warnings_ > kListedWarnings) return;
    const auto [line, place] = place_of(step, columns_.first_time());
    problems_.warning(line, place, std::move(message), std::move(hint));
}

/// With one time per row, missing rows show only as a step that is too long.
void StepChecker::warn_of_long_steps() {
    // The longest step is within kLongStep of the shortest, so of the median too.
    if (!(steps_.longest > kLongStep * steps_.shortest)) return;
    std::vector<double> sorted = rain_.duration_h;
    const auto middle = sorted.begin() + static_cast<std::ptrdiff_t>(sorted.size() / 2);
    std::nth_element(sorted.begin(), middle, sorted.end());
    const double median_h = *middle;
    warnings_ = 0;
    for (std::size_t i = 0; i < rain_.steps(); ++i)
        if (rain_.duration_h[i] > kLongStep * median_h)
            warn(i,
                 "this step lasts " + minutes_text(rain_.duration_h[i]) +
                     ", over three times the usual " + minutes_text(median_h) + change_text(i),
                 "if rows are missing here, state how long each row covers with every:");
    count_unlisted("long");
}

/// A logger whose clock is never changed, read with offsets or a zone that do change, shows as one
/// step that is longer or shorter than its neighbour by just that change.
void StepChecker::warn_of_clock_changes() {
    if (!rain_.stamps || rain_.steps() < 2) return;
    warnings_ = 0;
    for (std::size_t i = 0; i < rain_.steps(); ++i) {
        if (offset_change(i) == 0) continue;
        const double usual_h = rain_.duration_h[i > 0 ? i - 1 : i + 1];
        const double face_h = rain_.duration_h[i] + offset_change(i) / 60.0;
        const bool told_as_long = rain_.duration_h[i] > kLongStep * usual_h;
        if (std::abs(face_h - usual_h) >= kMillisecond_h || told_as_long) continue;
        warn(i,
             "this step lasts " + minutes_text(rain_.duration_h[i]) + ", the one beside it " +
                 minutes_text(usual_h) + change_text(i),
             "if the logger's clock is never changed, write one offset in every row, or state a "
             "zone without changes");
    }
    count_unlisted("changed");
}

void StepChecker::count_unlisted(std::string_view which) {
    if (warnings_ <= kListedWarnings) return;
    const std::size_t more = warnings_ - kListedWarnings;
    problems_.file_warning("and " + std::to_string(more) + " more " + std::string(which) +
                           (more == 1 ? " step" : " steps"));
}

/// By how many minutes the UTC offset rises within a step.
int StepChecker::offset_change(std::size_t step) const {
    return rain_.stamps->offset_minutes[step + 1] - rain_.stamps->offset_minutes[step];
}

std::string StepChecker::change_text(std::size_t step) const {
    if (!rain_.stamps || offset_change(step) == 0) return {};
    return "; the UTC offset changes in it from " +
           offset_text(rain_.stamps->offset_minutes[step]) + " to " +
           offset_text(rain_.stamps->offset_minutes[step + 1]);
}

/// Line and column of a cell in the row that gives a step. Walks the file anew: rows do not carry
/// their places, and few are ever asked for.
std::pair<std::size_t, std::size_t> StepChecker::place_of(std::size_t step,
                                                          const CsvColumn& column) const {
    const auto holes = std::lower_bound(steps_.holes.begin(), steps_.holes.end(), step);
    const auto holes_before = static_cast<std::size_t>(holes - steps_.holes.begin());
    CsvLines lines(text_);
    CsvLine line;
    // The header and the rows above come first.
    for (std::size_t skip = step - holes_before + steps_.rows_before + 2; skip > 0; --skip) {
        if (!lines.next(line)) break;
        lines.use_separator(columns_.separator);
    }
    const char* at = line.text.data();
    const char* const end = at + line.text.size();
    std::string buffer;
    for (std::size_t i = 0; i < column.index; ++i) {
        static_cast<void>(cut_cell(at, end, columns_.separator, buffer));
        if (at != end) ++at;
    }
    return {line.number, line.column_of(cut_cell(at, end, columns_.separator, buffer).begin)};
}

}  // namespace

void check_steps(const Hyetograph& rain, const CsvSteps& steps, const CsvColumns& columns,
                 std::string_view text, CsvProblems& problems) {
    StepChecker checker(rain, steps, columns, text, problems);
    checker.check_sizes();
    if (problems.any_error()) return;
    checker.warn_of_long_steps();
    checker.warn_of_clock_changes();
}

}  // namespace rainledger
