# What every target of ours shares: C++20, warnings, and arithmetic that prints the same digits on every machine.
function(hz_target target)
  target_compile_features(${target} PUBLIC cxx_std_20)
  set_target_properties(${target} PROPERTIES CXX_EXTENSIONS OFF)
  target_compile_options(${target} PRIVATE
    -ffp-contract=off
    -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wsign-conversion -Wold-style-cast -Wnon-virtual-dtor
    $<$<BOOL:${HZ_WERROR}>:-Werror>
    # False alarms of g++ 12 inside its own std::vector, std::optional and std::string when it inlines at -O3.
    -Wno-error=stringop-overflow -Wno-error=array-bounds -Wno-error=maybe-uninitialized -Wno-error=restrict)
endfunction()
