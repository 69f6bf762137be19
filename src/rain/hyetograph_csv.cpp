#include "rainledger/rain/hyetograph_csv.hpp"

#include <algorithm>
#include <cmath>
#include <string_view>
#include <utility>

#include "rain/csv_header.hpp"
#include "rain/csv_plain_rows.hpp"
#include "rain/csv_rows.hpp"
#include "rain/csv_steps.hpp"
#include "rain/csv_text.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/rain/timestamp.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kListedLongSteps = 5;
constexpr double kLongStep = 3.0;       // times the median
constexpr std::size_t kSample = 65536;  // bytes

constexpr std::string_view kExample =
    "a file begins with a row such as 'end [min],depth [mm]', then one row per step";

constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";

bool is_utf16(std::string_view text) {
    return text.starts_with("\xFF\xFE") || text.starts_with("\xFE\xFF");
}

/// The rows of a text judged by its first part, and some more; to set memory aside.
std::size_t likely_rows(std::string_view text) {
    const std::string_view sample = text.substr(0, kSample);
    const auto lines = static_cast<std::size_t>(std::count(sample.begin(), sample.end(), '\n'));
    if (sample.size() == text.size()) return lines + 1;
    return text.size() / sample.size() * lines / 4 * 5;
}

std::string minutes_text(double hours) {
    return shortest(std::round(hours * 60.0 * 1000.0) / 1000.0) + " min";
}

/// Reads one file from its first line to its hyetograph.
class HyetographReader {
public:
    HyetographReader(const SourceText& source, const CsvLayout& layout, CsvProblems& problems)
        : source_(source), layout_(layout), problems_(problems), lines_(source.text()) {}

    std::optional<Hyetograph> read();

private:
    bool open();
    std::optional<CsvSteps> read_rows();
    [[nodiscard]] Hyetograph build(CsvSteps steps);
    [[nodiscard]] StampedEdges stamped_edges(const CsvSteps& steps);
    void check_sizes(const Hyetograph& rain, const CsvSteps& steps);
    void warn_of_long_steps(const Hyetograph& rain, const CsvSteps& steps);
    [[nodiscard]] std::pair<std::size_t, std::size_t> place_of_step(std::size_t step,
                                                                    const CsvSteps& steps) const;

    const SourceText& source_;
    const CsvLayout& layout_;
    CsvProblems& problems_;
    CsvLines lines_;
    CsvColumns columns_;
    std::optional<Zone> zone_;
    bool has_offset_ = false;
};

bool HyetographReader::open() {
    if (is_utf16(source_.text())) {
        problems_.file_error("the file is UTF-16 text", "save it as UTF-8");
        return false;
    }
    if (layout_.zone && !(zone_ = Zone::find(*layout_.zone)))
        problems_.file_error("time zone " + shown(*layout_.zone) + " is not known here",
                             "write a name of the time zone database, such as Europe/Madrid");
    CsvLine header;
    if (!lines_.next(header)) {
        problems_.file_error("the file holds no rows", std::string(kExample));
        return false;
    }
    auto columns = read_csv_header(header, layout_, problems_);
    if (!columns) return false;
    columns_ = std::move(*columns);
    if (layout_.zone && !columns_.stamped)
        problems_.warning(columns_.line, columns_.first_time().place,
                          "elapsed times have no use for the scenario's zone:");
    return !problems_.any_error();
}

std::optional<CsvSteps> HyetographReader::read_rows() {
    CsvRowReader reader(columns_, layout_, zone_, problems_);
    CsvStepMaker maker(columns_, layout_, problems_, likely_rows(source_.text()));
    if (problems_.any_error()) return std::nullopt;
    CsvLine line;
    CsvRow row;
    bool any_row = false;
    while (lines_.next(line) && !reader.header_lacks_unit()) {
        any_row = true;
        if (reader.read(line, row)) {
            maker.add(row);
            add_plain_rows(columns_, reader, lines_, maker);
        } else {
            maker.add_unread();
        }
    }
    if (!any_row)
        problems_.error(columns_.line, 1, "there are no rows below the header",
                        std::string(kExample));
    CsvSteps steps = maker.finish();
    if (problems_.any_error()) return std::nullopt;
    has_offset_ = zone_ || reader.saw_offsets();
    return steps;
}

StampedEdges HyetographReader::stamped_edges(const CsvSteps& steps) {
    StampedEdges edges;
    edges.unix_ms.reserve(steps.edges.size());
    for (const double edge : steps.edges)
        edges.unix_ms.push_back(static_cast<std::int64_t>(edge));
    edges.offset_minutes = steps.offset_minutes;
    edges.has_offset = has_offset_;
    if (zone_)
        for (std::size_t i = 0; i < edges.unix_ms.size(); ++i)
            edges.offset_minutes[i] = zone_->offset_minutes(edges.unix_ms[i]);
    return edges;
}

Hyetograph HyetographReader::build(CsvSteps steps) {
    Hyetograph rain =
        columns_.stamped
            ? make_hyetograph(stamped_edges(steps), std::move(steps.rain))
            : make_hyetograph(std::move(steps.edges), columns_.time_unit, std::move(steps.rain));
    if (columns_.kind == RainKind::intensity)
        for (std::size_t i = 0; i < rain.steps(); ++i)
            rain.depth_mm[i] *= rain.duration_h[i];
    for (const std::size_t step : steps.dry)
        rain.taken_as_dry_h += rain.duration_h[step];
    check_sizes(rain, steps);
    if (!problems_.any_error()) warn_of_long_steps(rain, steps);
    return rain;
}

/// What is sound in the file's own units can still vanish or overflow in hours and mm.
void HyetographReader::check_sizes(const Hyetograph& rain, const CsvSteps& steps) {
    for (std::size_t i = 0; i < rain.steps(); ++i) {
        const double edge_h = rain.edges_h[i + 1];
        const bool has_length = edge_h > rain.edges_h[i] && rain.duration_h[i] > 0.0;
        const bool is_finite = std::isfinite(edge_h) && std::isfinite(rain.duration_h[i]);
        if (has_length && is_finite && std::isfinite(rain.depth_mm[i])) continue;
        const auto [line, column] = place_of_step(i, steps);
        if (!has_length)
            problems_.error(line, column, "this step has no length in hours",
                            "its start and end are too close for a number to tell apart");
        else
            problems_.error(line, column, "this step's rain or time is too large to compute with");
    }
    if (!problems_.any_error() && !std::isfinite(total_depth_mm(rain)))
        problems_.file_error("the rain is too large to add up");
}

/// With one time per row, missing rows show only as a step that is too long.
void HyetographReader::warn_of_long_steps(const Hyetograph& rain, const CsvSteps& steps) {
    // The longest step is within kLongStep of the shortest, so of the median too.
    if (!(steps.longest > kLongStep * steps.shortest)) return;
    std::vector<double> sorted = rain.duration_h;
    const auto middle = sorted.begin() + static_cast<std::ptrdiff_t>(sorted.size() / 2);
    std::nth_element(sorted.begin(), middle, sorted.end());
    const double median_h = *middle;
    std::size_t count = 0;
    for (std::size_t i = 0; i < rain.steps(); ++i) {
        if (rain.duration_h[i] <= kLongStep * median_h || ++count > kListedLongSteps) continue;
        const auto [line, column] = place_of_step(i, steps);
        problems_.warning(line, column,
                          "this step lasts " + minutes_text(rain.duration_h[i]) +
                              ", over three times the usual " + minutes_text(median_h),
                          "if rows are missing here, state how long each row covers with every:");
    }
    if (count <= kListedLongSteps) return;
    const std::size_t more = count - kListedLongSteps;
    problems_.file_warning("and " + std::to_string(more) + " more long " +
                           (more == 1 ? "step" : "steps"));
}

/// Line and column of the time cell in the row that gives step `step`. Walks the file anew: rows
/// do not carry their places, and few are ever asked for.
std::pair<std::size_t, std::size_t> HyetographReader::place_of_step(std::size_t step,
                                                                    const CsvSteps& steps) const {
    const auto holes = std::lower_bound(steps.holes.begin(), steps.holes.end(), step);
    const auto holes_before = static_cast<std::size_t>(holes - steps.holes.begin());
    CsvLines lines(source_.text());
    CsvLine line;
    // The header and the rows above come first.
    for (std::size_t skip = step - holes_before + steps.rows_before + 2; skip > 0; --skip)
        if (!lines.next(line)) break;
    const char* at = line.text.data();
    const char* const end = at + line.text.size();
    std::string buffer;
    for (std::size_t i = 0; i < columns_.first_time().index; ++i) {
        static_cast<void>(cut_cell(at, end, columns_.separator, buffer));
        if (at != end) ++at;
    }
    return {line.number, line.column_of(cut_cell(at, end, columns_.separator, buffer).begin)};
}

std::optional<Hyetograph> HyetographReader::read() {
    if (!open()) return std::nullopt;
    auto steps = read_rows();
    if (!steps) return std::nullopt;
    Hyetograph rain = build(std::move(*steps));
    if (problems_.any_error()) return std::nullopt;
    return rain;
}

}  // namespace

std::optional<Hyetograph> read_hyetograph_csv(const std::string& name, std::string text,
                                              const CsvLayout& layout, Diagnostics& diagnostics) {
    if (text.starts_with(kByteOrderMark)) text.erase(0, kByteOrderMark.size());
    const SourceText source(name, std::move(text));
    CsvProblems problems(source, diagnostics);
    auto rain = HyetographReader(source, layout, problems).read();
    problems.close();
    return rain;
}

bool is_known_zone(const std::string& zone) {
    return Zone::find(zone).has_value();
}

}  // namespace rainledger
