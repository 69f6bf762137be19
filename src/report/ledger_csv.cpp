#include "rainledger/report/ledger_csv.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <cstddef>
#include <optional>
#include <span>
#include <string_view>
#include <vector>

#include "report/clock.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kLongestNumber = 24;  // "-2.2250738585072014e-308"
constexpr std::size_t kNumbersPerRow = 7;
constexpr std::size_t kRowRoom = kNumbersPerRow * (kLongestNumber + 1);

/// A name as a CSV cell, after RFC 4180: in quotes where it holds a quote, a comma or a line break.
void append_cell(std::string& out, std::string_view text) {
    if (text.find_first_of("\",\r\n") == std::string_view::npos) {
        out += text;
        return;
    }
    out += '"';
    for (const char c : text) {
        if (c == '"') out += '"';
        out += c;
    }
    out += '"';
}

/// Pieces of text in one string.
class Pieces {
public:
    std::string& growing() { return text_; }
    void finish() { ends_.push_back(text_.size()); }
    [[nodiscard]] std::string_view operator[](std::size_t i) const {
        const std::size_t begin = i == 0 ? 0 : ends_[i - 1];
        return std::string_view(text_).substr(begin, ends_[i] - begin);
    }

private:
    std::string text_;
    std::vector<std::size_t> ends_;
};

char* put(char* at, char* end, double value) {
    return std::to_chars(at, end, value + 0.0).ptr;  // a negative zero loses its sign
}

/// What the rows of all areas share, formatted once per step: "step,start_h,end_h," in front and
/// ",start" behind.
struct StepTexts {
    Pieces front;
    Pieces behind;
};

StepTexts step_texts(const Storm& storm, std::span<const double> edges_h, bool with_start) {
    StepTexts texts;
    std::array<char, 2 * kLongestNumber + 24> buffer{};
    char* const end = buffer.data() + buffer.size();
    std::optional<StampedEdges> stamps;
    if (with_start && storm.rain.stamps) stamps = stamps_at(storm.rain, edges_h);
    for (std::size_t step = 0; step + 1 < edges_h.size(); ++step) {
        char* at = std::to_chars(buffer.data(), end, step + 1).ptr;
        *at++ = ',';
        at = put(at, end, edges_h[step]);
        *at++ = ',';
        at = put(at, end, edges_h[step + 1]);
        *at++ = ',';
        texts.front.growing().append(buffer.data(), at);
        texts.front.finish();
        if (with_start) texts.behind.growing() += ',';
        if (stamps) texts.behind.growing() += iso_stamp(*stamps, step);
        texts.behind.growing() += '\n';
        texts.behind.finish();
    }
    return texts;
}

char* put_accounts(char* at, char* end, const LedgerRow& row) {
    const Accounts& accounts = row.accounts;
    for (const double value : {accounts.rain_mm, accounts.run_on_mm, accounts.initial_loss_mm,
                               accounts.infiltrated_mm, accounts.ponded_mm, accounts.excess_mm}) {
        at = put(at, end, value);
        *at++ = ',';
    }
    return std::isfinite(row.capacity_mm_per_h) ? put(at, end, row.capacity_mm_per_h) : at;
}

void append_area(std::string& out, const std::string& names, const StepTexts& texts,
                 std::span<const LedgerRow> rows) {
    std::array<char, kRowRoom> buffer{};
    for (std::size_t step = 0; step < rows.size(); ++step) {
        const char* const end =
            put_accounts(buffer.data(), buffer.data() + buffer.size(), rows[step]);
        out += names;
        out += texts.front[step];
        out.append(buffer.data(), static_cast<std::size_t>(end - buffer.data()));
        out += texts.behind[step];
    }
}

std::string names_of(const Storm& storm, std::string_view drains_to, std::string_view surface) {
    std::string out;
    for (const std::string_view name : {std::string_view(storm.name), drains_to, surface}) {
        append_cell(out, name);
        out += ',';
    }
    return out;
}

void append_rows(std::string& out, const Site& site, const Storm& storm, const SiteLedger& ledger,
                 std::span<const double> edges_h, bool with_start) {
    const StepTexts texts = step_texts(storm, edges_h, with_start);
    for (std::size_t i = 0; i < site.surfaces.size(); ++i) {
        const Surface& surface = site.surfaces[i];
        append_area(out, names_of(storm, surface.drains_to, surface.name), texts,
                    ledger.surfaces[i].rows);
    }
    for (const PlaceLedger& place : ledger.places)
        append_area(out, names_of(storm, place.name, ""), texts, place.rows);
    append_area(out, names_of(storm, "", ""), texts, ledger.site.rows);
}

}  // namespace

bool has_start_column(const Scenario& scenario) {
    return std::any_of(scenario.storms.begin(), scenario.storms.end(),
                       [](const Storm& storm) { return storm.rain.stamps.has_value(); });
}

void append_ledger_header(std::string& out, bool with_start) {
    out +=
        "storm,drains_to,surface,step,start_h,end_h,rain_mm,run_on_mm,initial_loss_mm,"
        "infiltrated_mm,ponded_mm,excess_mm,capacity_mm_per_h";
    out += with_start ? ",start\n" : "\n";
}

void append_ledger_rows(std::string& out, const Site& site, const Storm& storm,
                        const SiteLedger& ledger, bool with_start) {
    append_rows(out, site, storm, ledger, storm.rain.edges_h, with_start);
}

void append_ledger_rows(std::string& out, const Site& site, const Storm& storm,
                        const ReportedLedger& reported, bool with_start) {
    append_rows(out, site, storm, reported.ledger, reported.edges_h, with_start);
}

}  // namespace rainledger
