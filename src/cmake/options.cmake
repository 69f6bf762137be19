# Compile options of our own targets; never global, so that a parent project keeps its own.
add_library(rainledger_options INTERFACE)
target_compile_features(rainledger_options INTERFACE cxx_std_20)
target_include_directories(rainledger_options INTERFACE
                           $<BUILD_INTERFACE:${PROJECT_SOURCE_DIR}/include>)
# A product and a sum are rounded one by one, so that answers agree between compilers and
# instruction sets and a hand calculation can be followed to the last digit.
target_compile_options(rainledger_options INTERFACE -ffp-contract=off)
if(RAINLEDGER_DEVELOPER)
  target_compile_options(rainledger_options INTERFACE
    -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wsign-conversion -Wdouble-promotion
    -Wold-style-cast -Wcast-align -Wnon-virtual-dtor -Woverloaded-virtual -Wnull-dereference
    -Wimplicit-fallthrough -Wformat=2 -Wundef -Wmissing-declarations -Wextra-semi -Werror
    $<$<CXX_COMPILER_ID:GNU>:-Wduplicated-cond -Wduplicated-branches -Wlogical-op -Wuseless-cast>)
endif()
# g++ 12 warns falsely about overlapping copies in string concatenation (GCC bug 105651).
target_compile_options(rainledger_options INTERFACE $<$<CXX_COMPILER_ID:GNU>:-Wno-restrict>)
if(RAINLEDGER_FEW_CASES)
  target_compile_definitions(rainledger_options INTERFACE RAINLEDGER_FEW_CASES)
endif()
if(RAINLEDGER_FUZZ)
  target_compile_options(rainledger_options INTERFACE -fsanitize=fuzzer-no-link)
endif()
if(RAINLEDGER_SANITIZE)
  target_compile_options(rainledger_options INTERFACE
    -fsanitize=${RAINLEDGER_SANITIZE} -fno-sanitize-recover=all -fno-omit-frame-pointer -D_GLIBCXX_ASSERTIONS)
  target_link_options(rainledger_options INTERFACE -fsanitize=${RAINLEDGER_SANITIZE})
endif()
