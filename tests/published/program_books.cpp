#include "published/program_books.hpp"

#include <array>
#include <cstdlib>
#include <limits>
#include <sstream>
#include <stdexcept>
#include <string>

#include <nlohmann/json.hpp>

#include "folder.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger::published {
namespace {

using testing::Folder;

void run_program(const Folder& folder, const std::string& scenario) {
    folder.write("scenario.yaml", scenario);
    const std::string command =
        std::string("'" RAINLEDGER_PROGRAM "' losses '") + folder.path("scenario.yaml") +
        "' --ledger '" + folder.path("ledger.csv") + "' --json '" + folder.path("all.json") +
        "' > '" + folder.path("out") + "' 2> '" + folder.path("messages") + "'";
    if (std::system(command.c_str()) != 0)
        throw std::runtime_error("the program fails: " + folder.read("messages"));
}

double number_cell(const std::string& cell) {
    if (cell.empty()) return std::numeric_limits<double>::quiet_NaN();
    const auto value = parse_number(cell);
    if (!value) throw std::runtime_error("'" + cell + "' in the ledger is no number");
    return *value;
}

// Columns of the ledger.
constexpr const char* kLedgerHeader =
    "storm,drains_to,surface,step,start_h,end_h,rain_mm,run_on_mm,initial_loss_mm,"
    "infiltrated_mm,ponded_mm,excess_mm,capacity_mm_per_h";
constexpr std::size_t kColumns = 13;
constexpr std::size_t kSurface = 2;
constexpr std::size_t kStart = 4;

using LedgerCells = std::array<std::string, kColumns>;

LedgerCells cells_of(const std::string& line) {
    LedgerCells cells;
    std::size_t column = 0;
    for (const char c : line) {
        if (c == ',')
            ++column;
        else
            cells.at(column) += c;
    }
    if (column + 1 != kColumns) throw std::runtime_error("a short row in the ledger: " + line);
    return cells;
}

void add_row(StormBooks& books, const LedgerCells& cells) {
    std::array<double, kColumns - kStart> number{};
    for (std::size_t i = 0; i < number.size(); ++i)
        number.at(i) = number_cell(cells.at(kStart + i));
    const auto [start, end, rain, run_on, initial_loss, infiltrated, ponded, excess, capacity] =
        number;
    books.start_h.push_back(start);
    books.end_h.push_back(end);
    books.rows.push_back({{rain, run_on, initial_loss, infiltrated, ponded, excess}, capacity});
}

void read_ledger(StormBooks& books, const std::string& text) {
    std::istringstream lines(text);
    std::string line;
    std::getline(lines, line);
    if (line != kLedgerHeader) throw std::runtime_error("the ledger's header is " + line);
    while (std::getline(lines, line)) {
        const LedgerCells cells = cells_of(line);
        if (!cells.at(kSurface).empty()) add_row(books, cells);
    }
}

std::optional<double> number_or_none(const nlohmann::json& value) {
    if (value.is_null()) return std::nullopt;
    return value.get<double>();
}

void read_json(StormBooks& books, const std::string& text) {
    const nlohmann::json storm = nlohmann::json::parse(text).at("storms").at("storm");
    const nlohmann::json surface = *storm.at("surfaces").begin();
    books.total = {surface.at("rain_mm"),         surface.at("run_on_mm"),
                   surface.at("initial_loss_mm"), surface.at("infiltrated_mm"),
                   surface.at("ponded_mm"),       surface.at("excess_mm")};
    for (const nlohmann::json& pond : surface.at("ponding"))
        books.ponding.push_back({pond.at("start_h"), number_or_none(pond.at("end_h"))});
    books.runoff_start_h = number_or_none(surface.at("runoff_start_h"));
    if (surface.at("method") == "phi_index")
        books.phi_index_mm_per_h = surface.at("parameters").at("rate_mm_per_h").get<double>();
    books.excess_volume_m3 = storm.at("site").at("excess_volume_m3");
}

}  // namespace

StormBooks program_books(const StoredStorm& storm) {
    const Folder folder;
    run_program(folder, storm.scenario);
    StormBooks books;
    read_ledger(books, folder.read("ledger.csv"));
    read_json(books, folder.read("all.json"));
    return books;
}

}  // namespace rainledger::published
