#include <algorithm>
#include <cstdint>
#include <string>
#include <vector>

#include "rain/record_helpers.hpp"
#include "rain/synthetic_logger.hpp"

namespace rainledger {

TEST_CASE("a year of a logger's file is read as it was written, whatever befell the logger") {
    const auto seed = GENERATE(1U, 2U, 3U, 4U, 5U, 20310614U);
    CAPTURE(seed);
    const std::vector<std::int64_t> tips = year_of_tips(seed);
    REQUIRE(tips.size() > 2000);
    const LoggerFile file = logger_file(tips, seed);
    const ReadRecordText read = read_record_text(file.text, tip_layout());
    REQUIRE(read.record.has_value());
    CHECK(tips_of(*read.record).unix_ms == file.unix_ms);
    const RecordNotes& notes = read.record->notes;
    CHECK(notes.rows == file.notes.rows);
    CHECK(notes.same_instant == file.notes.same_instant);
    CHECK(notes.repeated_rows == file.notes.repeated_rows);
    CHECK(notes.clock_set_back == file.notes.clock_set_back);
    CHECK(notes.repeated_headers == file.notes.repeated_headers);
    CHECK(notes.partial_last_line);
    CHECK(notes.counter_restarts == 0);
    CHECK(file.notes.repeated_rows > 0);
    CHECK(file.notes.clock_set_back > 0);
    CHECK_THAT(total_depth_mm(*read.record),
               WithinRel(0.2 * static_cast<double>(file.unix_ms.size()), 1e-12));
}

}  // namespace rainledger
